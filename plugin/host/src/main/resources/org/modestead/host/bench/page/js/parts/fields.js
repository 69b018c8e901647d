/** One field a kind of setting. A field shows a value and tells what was typed; it judges nothing itself. */
import {html, useRef, useState} from '../../lib.js';
import {upload} from '../actions.js';
import {getState} from '../store.js';
import {counted} from '../words.js';
import {FileBox} from './file-box.js';

const SHOWN = 300;
const FEW = 3;

/**
 * @param {object} props
 * @param {object} props.setting as declared
 * @param {any} props.value typed or effective
 * @param {object} props.about what the dialog knows: columns by port, words on them
 * @param {string} props.id of the control
 * @param {string} props.describedby ids of help and errors
 * @param {boolean} props.wrong
 * @param {(value: any, atOnce?: boolean) => void} props.type
 */
export function Field(props) {
  const Kind = KINDS[props.setting.kind] ?? TextField;
  return html`<${Kind} ...${props} />`;
}

/** The attributes that every control carries. */
function common({id, setting, describedby, wrong}) {
  return {
    id, 'data-field': setting.key, 'aria-describedby': describedby,
    'aria-invalid': wrong ? 'true' : undefined, 'aria-required': setting.required ? 'true' : undefined,
  };
}

function asText(value) {
  return value === null || value === undefined ? '' : Array.isArray(value) ? value.join(', ') : String(value);
}

function NumberField(props) {
  const {setting, value, type} = props;
  const initial = setting.initial === null ? 'not set' : asText(setting.initial);
  return html`<input ...${common(props)} class="field-input number" inputmode=${setting.kind === 'whole' ? 'numeric' : 'decimal'} autocomplete="off"
    placeholder=${initial} value=${asText(value)} oninput=${(e) => type(e.target.value)} />`;
}

function NumbersField(props) {
  const {value, type, setting} = props;
  return html`<input ...${common(props)} class="field-input" autocomplete="off" placeholder=${asText(setting.initial) || 'none'} value=${asText(value)}
    oninput=${(e) => type(e.target.value)} />`;
}

function TextField(props) {
  const {setting, value, type} = props;
  return setting.multiline
    ? html`<textarea ...${common(props)} class="field-input mono" rows="7" spellcheck="false" value=${asText(value)}
      oninput=${(e) => type(e.target.value)}></textarea>`
    : html`<input ...${common(props)} class="field-input" autocomplete="off" placeholder=${asText(setting.initial)} value=${asText(value)}
      oninput=${(e) => type(e.target.value)} />`;
}

function FlagField(props) {
  const {value, type, setting} = props;
  return html`<label class="check"><input ...${common(props)} type="checkbox" checked=${value === true || value === 'true'}
    onchange=${(e) => type(e.target.checked, true)} /><span>${setting.label}</span></label>`;
}

function ChoiceField(props) {
  const {setting, value, type, id} = props;
  if (setting.options.length <= FEW) {
    return html`<div class="choices" role="radiogroup" aria-labelledby=${id + '-label'} aria-describedby=${props.describedby}
      data-field=${setting.key} id=${id}>
      ${setting.options.map((option) => html`<label class="check" key=${option.id}><input type="radio" name=${id} value=${option.id} data-option=${option.id}
        checked=${value === option.id} onchange=${() => type(option.id, true)} /><span>${option.label}</span></label>`)}</div>`;
  }
  return html`<select ...${common(props)} class="field-input" onchange=${(e) => type(e.target.value, true)}>
    ${!setting.options.some((option) => option.id === value) && html`<option value=${asText(value)} selected>${asText(value)} (not one of these)</option>`}
    ${setting.options.map((option) => html`<option key=${option.id} value=${option.id} selected=${option.id === value}>${option.label}</option>`)}</select>`;
}

function columnWords(column) {
  const unit = column.unit && bareName(column) === column.name ? `, ${column.unit}` : '';
  return `${column.name} (${column.type}${unit})`;
}

/** A name without the unit that it ends with, which stands beside it: `flow [m3/h]` is flow. */
function bareName({name, unit}) {
  const end = `[${unit}]`;
  return unit && name.endsWith(end) && name.length > end.length ? name.slice(0, -end.length).trim() : name;
}

function offered({setting, about}) {
  const all = about.columns[setting.port];
  return all && all.filter((column) => setting.types.includes(column.type) || setting.types.includes(column.cell));
}

function ColumnField(props) {
  const {setting, value, type, id, about} = props;
  const columns = offered(props);
  if (!columns) {
    return html`<${TextField} ...${props} /><p class="help">${about.columnsWords[setting.port] ?? ''}</p>`;
  }
  if (columns.length > SHOWN) {
    return html`<input ...${common(props)} class="field-input" list=${id + '-list'} value=${asText(value)} oninput=${(e) => type(e.target.value)} />
      <datalist id=${id + '-list'}>${columns.map((column) => html`<option key=${column.name}
        value=${column.name}>${columnWords(column)}</option>`)}</datalist>`;
  }
  const missing = value && !columns.some((column) => column.name === value);
  return html`<select ...${common(props)} class="field-input" onchange=${(e) => type(e.target.value, true)}>
    <option value="" selected=${!value}>${setting.required ? 'Choose a column' : 'None'}</option>
    ${missing && html`<option value=${value} selected>${value} (not a fitting column of this table)</option>`}
    ${columns.map((column) => html`<option key=${column.name} value=${column.name}
      selected=${column.name === value}>${columnWords(column)}</option>`)}</select>`;
}

function linesOf(text) {
  return text.split('\n').map((line) => line.trim()).filter(Boolean);
}

function asList(value) {
  return Array.isArray(value) ? value : value ? linesOf(String(value)) : [];
}

function ColumnsField(props) {
  const {setting, value, type, id, about} = props;
  const [query, setQuery] = useState('');
  const columns = offered(props);
  const taken = asList(value);
  if (!columns) {
    return html`<${TextsField} ...${props} /><p class="help">One name a line. ${about.columnsWords[setting.port] ?? ''}</p>`;
  }
  const known = new Set(columns.map((column) => column.name));
  const strangers = taken.filter((name) => !known.has(name)).map((name) => ({name, type: 'not in this table', unit: ''}));
  const found = [...strangers, ...columns].filter((column) => column.name.toLowerCase().includes(query.toLowerCase()));
  const flip = (name) => type(inOrder(taken.includes(name) ? taken.filter((n) => n !== name) : [...taken, name], columns), true);
  const all = (on) => {
    const names = found.map((column) => column.name);
    type(inOrder(on ? [...new Set([...taken, ...names])] : taken.filter((name) => !names.includes(name)), columns), true);
  };
  return html`<div class="columns-box" role="group" aria-labelledby=${id + '-label'} aria-describedby=${props.describedby} data-field=${setting.key}>
    <div class="row">
      <input id=${id} class="field-input grow" type="search" aria-label=${`Search columns for ${setting.label}`} placeholder="Search columns" value=${query}
        oninput=${(e) => setQuery(e.target.value)} onkeydown=${(e) => e.key === 'Enter' && e.preventDefault()} />
      <button type="button" class="button" data-action="all-columns" onclick=${() => all(true)}>All</button>
      <button type="button" class="button" data-action="no-columns" onclick=${() => all(false)}>None</button>
    </div>
    <ul class="columns-list">${found.slice(0, SHOWN).map((column) => html`<li key=${column.name}><label class="check"><input type="checkbox"
      data-column=${column.name}
      checked=${taken.includes(column.name)} onchange=${() => flip(column.name)} /><span class="clip grow" title=${column.name}>${bareName(column)}</span>
      <span class="quiet small" data-unit=${column.unit}>${column.unit || column.type}</span></label></li>`)}</ul>
    <p class="help">${counted(taken.length, 'column')} chosen of ${columns.length}.${found.length > SHOWN ? ` The first ${SHOWN} are shown: search for others.` : ''}</p>
  </div>`;
}

/** Columns stand in the order of the table; those that it has not, at the end. */
function inOrder(names, columns) {
  const place = new Map(columns.map((column, i) => [column.name, i]));
  return [...names].sort((a, b) => (place.get(a) ?? Infinity) - (place.get(b) ?? Infinity) || 0);
}

/** The text stays as it is typed, with the line that is just begun, as long as it says what the setting holds. */
function TextsField(props) {
  const {value, type} = props;
  const [text, setText] = useState('');
  const held = Array.isArray(value) ? value.join('\n') : asText(value);
  return html`<textarea ...${common(props)} class="field-input" rows="3" spellcheck="false" placeholder="one a line"
    value=${linesOf(text).join('\n') === held ? text : held}
    oninput=${(e) => {
      setText(e.target.value);
      type(linesOf(e.target.value));
    }}></textarea>`;
}

function FileField(props) {
  const {setting, value, type, id} = props;
  const [open, setOpen] = useState(false);
  const elsewhere = useRef(null);
  const take = (path) => {
    setOpen(false);
    type(path, true);
    document.getElementById(id)?.focus();
  };
  const bring = async (file) => {
    const answer = file && await upload(file);
    if (answer) {
      take(answer.path);
    }
  };
  return html`<div class="file-field">
    <div class="row"><input ...${common(props)} class="field-input grow" autocomplete="off" spellcheck="false" value=${asText(value)}
      oninput=${(e) => type(e.target.value)} />
      <button type="button" class="button" data-action="choose-file" aria-expanded=${String(open)} aria-controls=${id + '-files'}
        onclick=${() => setOpen(!open)}>Choose…</button></div>
    ${open && html`<div id=${id + '-files'} class="file-choice">
      <${FileBox} extensions=${setting.extensions} label=${`Files for ${setting.label}`} folder=${getState().desk.folder ?? ''}
        pick=${(entry) => take(entry.relative ?? entry.path)} />
      ${setting.reading && setting.extensions.includes('csv') && html`<input ref=${elsewhere} class="unseen" type="file" tabindex="-1" aria-hidden="true"
          accept=${setting.extensions.map((end) => '.' + end).join(',')} onchange=${(e) => bring(e.target.files[0])} />
        <button type="button" class="button" data-action="file-elsewhere" onclick=${() => elsewhere.current.click()}>Copy one from elsewhere…</button>`}
    </div>`}
  </div>`;
}

const KINDS = {
  number: NumberField,
  whole: NumberField,
  numbers: NumbersField,
  text: TextField,
  flag: FlagField,
  choice: ChoiceField,
  column: ColumnField,
  columns: ColumnsField,
  texts: TextsField,
  file: FileField,
};
