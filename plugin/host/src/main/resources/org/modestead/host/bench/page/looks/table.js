import {html, useEffect, useId, useLayoutEffect, useMemo, useRef, useState} from '../lib.js';
import {count, counted, prose} from '../js/words.js';
import {cell, hundredths, labelled} from './numbers.js';
import {isSelected, words} from './keys.js';
import {PAGE} from './sources.js';
import {useWindowHeight} from './window-height.js';

/** Room for the bar below, which otherwise covers the last row. */
const BAR = 18;
/** More rows than this in one view are mapped onto a shorter bar, for no browser scrolls hundreds of millions of pixels. */
const TALLEST = 8000000;
/** Rows in sight; on a tall screen as many as fill this share of it. */
const SHOWN = 14;
const SHARE = 0.4;
const SPARE = 8;

/**
 * A table of any length: only the rows in sight are drawn and read. Sorted by its heads, walked through by keyboard.
 *
 * @param {object} given
 * @param {import('./sources.js').Source} given.source
 * @param {string} given.id for the hook `data-table`
 * @param {string} given.title
 * @param {string} given.selection
 * @param {(key: string) => void} given.select
 * @param {string} [given.csv] address of the whole table as a file
 * @param {number} [given.rows] most rows in sight; 0 for as many as suit the screen
 */
export function DataTable({source, id, title, selection, select, csv = '', rows = 0}) {
  const name = useId();
  const box = useRef(null);
  const [order, setOrder] = useState({sort: '', down: false, find: ''});
  const [pages, setPages] = useState({key: '', total: source.total, found: source.total ?? 0, whole: true, held: new Map(), fault: ''});
  const [top, setTop] = useState(0);
  const [current, setCurrent] = useState(-1);
  const [height, setHeight] = useState(26);
  const sizes = useMemo(() => ({current: null}), [source]);

  const key = JSON.stringify(order);
  const wanted = useRef('');
  wanted.current = key;
  const asked = useRef(new Set());
  const held = pages.key === key ? pages.held : new Map();
  const total = pages.total ?? 0;
  const found = pages.key !== key && order.find === '' ? total : pages.found;
  const suiting = Math.max(SHOWN, Math.floor(SHARE * useWindowHeight() / height));
  const inSight = rows || suiting;
  const visible = Math.min(inSight, Math.max(found, 1));
  const tall = Math.min(TALLEST, found * height);
  const first = firstRow(top, tall, visible * height, found, height);
  const from = Math.max(0, first - SPARE);
  const to = Math.min(found, first + visible + SPARE);

  useEffect(() => {
    for (let page = Math.floor(from / PAGE); page * PAGE < Math.max(to, 1); page++) {
      const question = `${key} ${page}`;
      if (held.has(page) || asked.current.has(question)) {
        continue;
      }
      asked.current.add(question);
      source.page(page * PAGE, PAGE, order).then((answer) => {
        if (wanted.current !== key) {
          return;
        }
        setPages((before) => ({key, ...(answer.whole || before.key !== key || !before.counted ? rowsOf(answer) : {total: before.total, found: before.found, whole: true}),
          counted: before.counted || answer.whole, fault: '', held: new Map([...(before.key === key ? before.held : []), [page, answer]].slice(-20))}));
        if (!answer.whole && !asked.current.has('count')) {
          asked.current.add('count');
          source.count().then((counted) => setPages((before) => ({...before, ...(before.key === key ? {...rowsOf(counted), counted: true} : {})})),
            (fault) => setPages((before) => ({...before, fault: fault.message})));
        }
      }, (fault) => wanted.current === key && setPages((before) => ({...before, fault: fault.message})))
        .finally(() => asked.current.delete(question));
    }
  }, [key, from, to, source]);

  useLayoutEffect(() => {
    const row = box.current?.querySelector('tbody tr[data-row]');
    const measured = row?.getBoundingClientRect().height;
    if (measured && Math.abs(measured - height) > 0.5) {
      setHeight(measured);
    }
  });

  const row = (index) => {
    const page = held.get(Math.floor(index / PAGE));
    const at = index % PAGE;
    return page && at < page.rows.length ? {cells: page.rows[at], number: page.numbers[at], key: page.keys[at]} : null;
  };
  if (!sizes.current && held.has(0)) {
    sizes.current = widths(source.columns, held.get(0).rows);
  }

  const go = (index) => {
    const at = Math.max(0, Math.min(found - 1, index));
    setCurrent(at);
    const view = visible * height;
    const place = found * height <= TALLEST ? at * height : (at / Math.max(1, found - visible)) * (tall - view);
    if (box.current && (at < first || at >= first + visible - 1)) {
      box.current.scrollTop = at < first ? place : Math.max(0, place - view + 2 * height);
    }
  };
  const sort = (column) => {
    setOrder(order.sort !== column ? {...order, sort: column, down: false} : order.down ? {...order, sort: '', down: false} : {...order, down: true});
    setCurrent(-1);
    if (box.current) {
      box.current.scrollTop = 0;
    }
  };
  const choose = (index) => {
    const at = row(index);
    if (at?.key) {
      select(at.key === selection ? '' : at.key);
    }
  };
  const onKeyDown = (event) => {
    if (event.target.tagName === 'BUTTON' || event.ctrlKey || event.metaKey || event.altKey) {
      return;
    }
    const steps = {ArrowDown: 1, ArrowUp: -1, PageDown: visible - 1, PageUp: 1 - visible};
    if (event.key in steps) {
      go(current < 0 ? first : current + steps[event.key]);
    } else if (event.key === 'Home') {
      go(0);
    } else if (event.key === 'End') {
      go(found - 1);
    } else if (event.key === 'Enter' || event.key === ' ') {
      choose(current);
    } else if (event.key === 'ArrowRight' || event.key === 'ArrowLeft') {
      box.current.scrollLeft += (event.key === 'ArrowRight' ? 1 : -1) * 60;
    } else {
      return;
    }
    event.preventDefault();
    event.stopPropagation();
  };

  // The bar is as long as all rows; where that is shorter than they would be, rows are put where the bar stands.
  const before = found * height <= TALLEST ? from * height : Math.max(0, Math.min(tall - (to - from) * height, top - (first - from) * height));
  const after = Math.max(0, tall - before - (to - from) * height);
  const units = source.columns.some(unitOf);
  const indices = Array.from({length: Math.max(0, to - from)}, (_, i) => from + i);
  return html`<div class="lk-table" data-table=${id} data-rows=${found} data-ready=${String(held.size > 0)} aria-busy=${String(held.size === 0)}>
    ${!(pages.fault && held.size === 0) && html`<${Bar} total=${total} whole=${pages.whole} searchable=${source.searchable} found=${found} order=${order} setOrder=${setOrder} go=${(number) => {
      go(number - 1);
      box.current?.querySelector('table')?.focus();
    }} csv=${csv} title=${title} id=${id} />`}
    ${pages.fault && html`<p class="lk-fault" role="alert">${pages.fault}</p>`}
    <div class="lk-rows" ref=${box} onScroll=${(event) => setTop(event.currentTarget.scrollTop)}
        style=${{maxHeight: `calc(${visible * height}px + 3.6em + ${BAR}px)`}}>
      <table role="grid" tabindex="0" aria-label=${title} aria-rowcount=${found + 1} aria-colcount=${source.columns.length + 1}
          aria-activedescendant=${current >= from && current < to ? `${name}-${current}` : null} onKeyDown=${onKeyDown}>
        ${sizes.current && html`<colgroup><col style=${{width: `${String(total).length + 3}ch`}} />
          ${sizes.current.map((size) => html`<col style=${{width: `${size}ch`}} />`)}</colgroup>`}
        <thead><tr aria-rowindex="1"><th scope="col" class="lk-number"><span class="unseen">row</span></th>
          ${source.columns.map((column) => html`<${Head} key=${column.name} column=${column} order=${order} sort=${sort} units=${units} />`)}</tr></thead>
        <tbody>
          ${before > 0 && html`<tr aria-hidden="true" class="lk-room"><td colspan=${source.columns.length + 1} style=${{height: `${before}px`}}></td></tr>`}
          ${indices.map((index) => html`<${Row} key=${index} id=${`${name}-${index}`} index=${index} row=${row(index)} columns=${source.columns}
            current=${index === current} selection=${selection} choose=${() => {
              setCurrent(index);
              choose(index);
            }} />`)}
          ${after > 0 && html`<tr aria-hidden="true" class="lk-room"><td colspan=${source.columns.length + 1} style=${{height: `${after}px`}}></td></tr>`}
        </tbody>
      </table>
    </div>
    ${found === 0 && held.size > 0 && html`<p class="lk-quiet">${order.find ? `No row holds "${order.find}".` : 'This table has no rows.'}</p>`}
  </div>`;
}

/** What an answer tells of the number of rows. */
function rowsOf({total, found, whole}) {
  return {total, found, whole};
}

/** The first row in sight for a place of the bar. */
function firstRow(top, tall, view, found, height) {
  const exact = found * height <= TALLEST ? top / height : (top / Math.max(1, tall - view)) * (found - view / height);
  return Math.max(0, Math.min(found - 1, Math.floor(exact)));
}

function Bar({total, whole, searchable, found, order, setOrder, go, csv, title, id}) {
  const [typed, setTyped] = useState('');
  const [text, setText] = useState(order.find);
  useEffect(() => {
    const later = setTimeout(() => text !== order.find && setOrder({...order, find: text}), 250);
    return () => clearTimeout(later);
  }, [text]);
  const many = total > SHOWN;
  return html`<div class="lk-bar">
    <span class="lk-quiet" role="status">${order.find ? `${count(found)} of ${counted(total, 'row')}` : whole ? counted(total, 'row')
        : `the first ${counted(total, 'row')}; all are being counted`}${
      order.sort ? `, sorted by ${order.sort}, ${order.down ? 'falling' : 'rising'}` : ''}</span>
    <span class="lk-gap"></span>
    ${many && searchable && html`<label>Find <input type="search" size="12" value=${text} data-action="find"
      onInput=${(event) => setText(event.currentTarget.value)} /></label>`}
    ${many && html`<label>Row <input type="text" inputmode="numeric" size="7" value=${typed} data-action="jump" aria-label=${`Go to a row of ${title}`}
      onInput=${(event) => setTyped(event.currentTarget.value)} onKeyDown=${(event) => {
        const number = parseInt(typed.replace(/\D/g, ''), 10);
        if (event.key === 'Enter' && number > 0) {
          event.preventDefault();
          go(number);
        }
      }} /></label>`}
    ${csv && html`<a class="lk-button" href=${csv} download data-action="csv" aria-label=${`${title} as a CSV file`}>CSV</a>`}
  </div>`;
}

function Head({column, order, sort, units}) {
  const sorted = order.sort === column.name ? (order.down ? 'descending' : 'ascending') : null;
  const unit = unitOf(column);
  return html`<th scope="col" aria-sort=${sorted} class=${numeric(column) ? 'lk-figure' : ''}>
    <button type="button" data-action="sort" data-column=${column.name} onClick=${() => sort(column.name)}
        title=${`Sort by ${column.name}`}>
      <span class="lk-column">${numeric(column) ? labelled(column.name).what : column.name}</span>
      <span class="lk-arrow" aria-hidden="true">${sorted === 'ascending' ? '\u2191' : sorted === 'descending' ? '\u2193' : ''}</span>
      ${units && html`<span class="lk-unit">${unit || '\u00a0'}</span>`}
    </button>
  </th>`;
}

function Row({id, index, row, columns, current, selection, choose}) {
  if (!row) {
    return html`<tr id=${id} data-row="" aria-rowindex=${index + 2}><td class="lk-number">${index + 1}</td>
      <td colspan=${columns.length} class="lk-quiet">\u2026</td></tr>`;
  }
  const selected = isSelected(row.key, selection);
  const mode = row.key.startsWith('mode:') ? row.key.slice(5) : null;
  return html`<tr id=${id} data-row=${row.number} data-row-mode=${mode} data-row-key=${row.key || null} aria-rowindex=${index + 2}
      aria-selected=${row.key ? String(selected) : null} class=${[current ? 'lk-current' : '', row.key ? 'lk-pick' : ''].join(' ').trim()}
      title=${row.key ? `Select ${words(row.key)} everywhere` : null} onClick=${row.key ? choose : null}>
    <td class="lk-number">${row.number}</td>
    ${row.cells.map((value, i) => html`<${Cell} key=${i} value=${value} column=${columns[i]} />`)}
  </tr>`;
}

function Cell({value, column}) {
  if (value === null || value === undefined || value === '') {
    return html`<td class=${numeric(column) ? 'lk-figure lk-quiet' : 'lk-quiet'}><span aria-hidden="true">\u2013</span><span class="unseen">missing</span></td>`;
  }
  const text = shown(value, column);
  const exact = typeof value === 'number' && text !== String(value) ? String(value) : text.length > 40 ? text : null;
  return html`<td class=${numeric(column) ? 'lk-figure' : ''} title=${exact}>${text}</td>`;
}

function shown(value, column) {
  if (value === 'Infinity' || value === '-Infinity') {
    return cell(Number(value));
  }
  if (typeof value === 'boolean') {
    return value ? 'yes' : 'no';
  }
  if (typeof value === 'number' && column.cell === 'DOUBLE') {
    return column.kind === 'share' ? hundredths(value) : cell(value);
  }
  return column.cell === 'TEXT' && typeof value === 'string' && value.includes(' ') ? prose(value) : String(value);
}

/** Dates and words have no unit. */
function unitOf(column) {
  return !numeric(column) ? '' : column.kind === 'share' ? '%' : column.unit || labelled(column.name).unit;
}

function numeric(column) {
  return column.cell === 'DOUBLE' || column.cell === 'LONG' || column.right === true;
}

/** Widths in letters, from the head and the first rows, so that nothing moves when other rows come into sight. */
function widths(columns, rows) {
  return columns.map((column, i) => {
    const longest = rows.reduce((most, row) => Math.max(most, row[i] === null ? 1 : shown(row[i], column).length), 0);
    return Math.min(60, Math.max(longest + (numeric(column) ? 2 : 0), labelled(column.name).what.length + 2, unitOf(column).length) + 3);
  });
}
