/** The dialog of a step, made from the node's declaration: groups, units, ranges, help; the server judges what is typed. */
import {html, useEffect, useRef, useState} from '../../lib.js';
import {api} from '../api.js';
import {getState} from '../store.js';
import {attempt, closeDialog, edit, run, say} from '../actions.js';
import {nodeOf, stepWith} from '../catalog.js';
import {Dialog, cancelButton} from './dialog.js';
import {Field} from './fields.js';
import {counted} from '../words.js';

const PAUSE = 250;

/** @param {{step: string, field?: string}} props the step, and the setting that is to be set right */
export function StepDialog({step: id, field}) {
  const {catalog, desk} = getState();
  const step = stepWith(desk, id);
  const node = nodeOf(catalog, step.node);
  const [about, setAbout] = useState(null);
  const [typed, setTyped] = useState({});
  const [busy, setBusy] = useState(false);
  const [leaving, setLeaving] = useState(false);
  const judging = useRef({timer: 0, stop: null});
  const body = useRef(null);
  useEffect(() => {
    attempt(() => api.get(`/api/steps/${id}/dialog`)).then((answer) => (answer ? setAbout(answer) : closeDialog()));
    return () => {
      clearTimeout(judging.current.timer);
      judging.current.stop?.abort();
    };
  }, [id]);
  useEffect(() => {
    if (about && !body.current.contains(document.activeElement)) {
      const wanted = field && body.current.querySelector(`[data-field="${CSS.escape(field)}"]`);
      const first = wanted ?? body.current.querySelector('input, select, textarea');
      (first?.matches('input, select, textarea') ? first : first?.querySelector('input'))?.focus();
      wanted?.scrollIntoView({block: 'center'});
    }
  }, [about !== null]);

  const judge = (now, atOnce) => {
    clearTimeout(judging.current.timer);
    judging.current.timer = setTimeout(async () => {
      judging.current.stop?.abort();
      judging.current.stop = new AbortController();
      try {
        setAbout(await api.post(`/api/steps/${id}/check`, {typed: now}, judging.current.stop.signal));
      } catch (fault) {
        if (fault.name !== 'AbortError') {
          say(fault.message);
        }
      }
    }, atOnce ? 0 : PAUSE);
  };
  const type = (key, value, atOnce) => {
    const now = {...typed, [key]: value};
    setTyped(now);
    setLeaving(false);
    judge(now, atOnce);
  };
  const keep = async (thenRun) => {
    if (busy) {
      return;
    }
    if (Object.keys(typed).length > 0) {
      setBusy(true);
      const answer = await edit([{do: 'set', step: id, typed}]);
      setBusy(false);
      if (!answer) {
        return;
      }
      say(`Settings of ${step.title} kept: ${stepWith(answer, id)?.state.words}.`);
    }
    closeDialog();
    if (thenRun) {
      run([id]);
    }
  };
  const changes = Object.keys(typed).length;
  const close = () => (changes === 0 ? closeDialog() : setLeaving(true));
  const foot = leaving ? html`<p class="grow dialog-told" role="alert">${counted(changes, 'setting was', 'settings were')} changed and not kept.</p>
    <button type="button" class="button" data-action="stay" onclick=${() => setLeaving(false)}>Go on setting</button>
    <button type="button" class="button danger" data-action="leave" onclick=${closeDialog}>Leave them as they were</button>`
    : html`<p class=${'grow dialog-told' + (about?.problems.length ? ' tone-stop' : ' quiet')} role="status">${busy ? 'Keeping the settings.' : about ? told(about, changes) : ''}</p>
    ${cancelButton}
    <button type="button" class="button" data-action="apply-run" onclick=${() => keep(true)}>Keep and run</button>
    <button type="submit" class="button main" data-action="apply">Keep</button>`;
  return html`<${Dialog} title=${`Settings of ${step.title}`} kind="settings" onsubmit=${() => keep(false)} onclose=${close} foot=${foot}>
    <div class="settings" ref=${body}>
      ${about ? html`<${Form} node=${node} about=${about} typed=${typed} type=${type} />` : html`<p class="quiet">Reading the settings.</p>`}
    </div>
  <//>`;
}

function told(about, changes) {
  if (about.problems.length) {
    return `${counted(about.problems.length, 'thing', 'things')} to set right. They can be kept as they are; the step will not run.`;
  }
  return changes ? `All settings can be used. ${counted(changes, 'setting', 'settings')} changed.` : 'All settings can be used.';
}

function Form({node, about, typed, type}) {
  const visible = new Set(about.visible);
  const shown = node.settings.filter((setting) => visible.has(setting.key));
  const groups = [...new Set(shown.map((setting) => setting.group))];
  const general = about.problems.filter((problem) => !visible.has(problem.setting));
  if (shown.length === 0) {
    return html`<p>${node.title} has nothing to set.</p>`;
  }
  return html`<div class="settings-frame">
    ${groups.length > 1 && html`<nav class="settings-groups" aria-label="Groups of settings"><ul>${groups.map((group) => html`<li key=${group}>
      <button type="button" class="group-link" onclick=${(e) => goTo(e, group)}>${group}${wrongIn(group, shown, about) > 0 && html`<span
        class="tone-stop"> (${wrongIn(group, shown, about)})</span>`}</button></li>`)}</ul></nav>`}
    <div class="settings-list">
      <details class="settings-purpose"><summary>${node.purpose}</summary>
        ${node.description.split(/\n\s*\n/).map((part, i) => html`<p key=${i}>${part}</p>`)}</details>
      ${general.length > 0 && html`<div class="callout stop"><ul>${general.map((problem, i) => html`<li key=${i}>${problem.sentence}</li>`)}</ul></div>`}
      ${groups.map((group) => html`<section key=${group} class="settings-group" data-group=${group} tabindex="-1" aria-label=${group}>
        ${groups.length > 1 && html`<h3>${group}</h3>`}
        ${shown.filter((setting) => setting.group === group).map((setting) => html`<${Setting} key=${setting.key} setting=${setting} about=${about} typed=${typed} type=${type} />`)}
      </section>`)}
    </div>
  </div>`;
}

function goTo(event, group) {
  const section = event.target.closest('.settings-frame').querySelector(`[data-group="${CSS.escape(group)}"]`);
  section.scrollIntoView({block: 'start'});
  section.querySelector('input, select, textarea')?.focus({preventScroll: true});
}

function wrongIn(group, shown, about) {
  const keys = new Set(shown.filter((setting) => setting.group === group).map((setting) => setting.key));
  return about.problems.filter((problem) => keys.has(problem.setting)).length;
}

function Setting({setting, about, typed, type}) {
  const id = `set-${setting.key}`;
  const isTyped = Object.hasOwn(typed, setting.key);
  const value = (isTyped ? typed[setting.key] : about.values[setting.key]) ?? setting.initial;
  const problems = about.problems.filter((problem) => problem.setting === setting.key);
  const isInitial = isTyped ? isEmpty(typed[setting.key]) || same(typed[setting.key], setting.initial)
    : !Object.hasOwn(about.settings, setting.key) || same(about.settings[setting.key], setting.initial);
  const help = `${id}-help`;
  const error = `${id}-error`;
  const unit = unitWords(setting.unit, about.timeUnit);
  const option = setting.kind === 'choice' && setting.options.find((o) => o.id === value);
  const range = rangeWords(setting, about.timeUnit);
  const text = setting.kind === 'flag' ? html`<span class="setting-label"></span>`
    : html`<label class="setting-label" id=${id + '-label'} for=${setting.kind === 'choice' && setting.options.length <= 3 ? undefined : id}>${setting.label}${
      setting.required && html`<span class="quiet small"> needed</span>`}</label>`;
  return html`<div class=${'setting' + (problems.length ? ' wrong' : '') + (isInitial ? '' : ' changed')} data-setting=${setting.key}>
    ${text}
    <div class="setting-field">
      <div class="setting-line">
        <${Field} setting=${setting} value=${shownValue(setting, value, isInitial && !isTyped)} about=${about}
          id=${id} describedby=${problems.length ? `${error} ${help}` : help}
          wrong=${problems.length > 0} type=${(v, atOnce) => type(setting.key, v, atOnce)} />
        ${unit && html`<span class="setting-unit">${unit}</span>`}
      </div>
      ${problems.length > 0 && html`<p class="setting-error" id=${error}>${problems.map((problem) => `Now ${problem.seen}: ${problem.wanted}.`).join(' ')}</p>`}
      <p class="help" id=${help}>${setting.help}${range && html`<span class="setting-range"> ${range}</span>`}${
        option?.help && html`<br /><strong>${option.label}:</strong> ${option.help}`}</p>
    </div>
    <div class="setting-reset">${isInitial ? html`<span class="quiet small">default</span>`
      : html`<button type="button" class="link-button small" data-action="reset" data-reset=${setting.key}
          aria-label=${`Set ${setting.label} back to its default${initialWords(setting)}`}
            onclick=${() => type(setting.key, null, true)}>Default</button>`}</div>
  </div>`;
}

/** A field at its default is empty and shows the default in its place, where it can; what is being typed stays, even where it is the default. */
function shownValue(setting, value, isInitial) {
  return isInitial && (setting.kind === 'number' || setting.kind === 'whole' || setting.kind === 'numbers') ? '' : value;
}

function isEmpty(value) {
  return value === null || value === undefined || value === '' || (Array.isArray(value) && value.length === 0);
}

function same(a, b) {
  return JSON.stringify(a) === JSON.stringify(b) || (typeof a !== 'object' && typeof b !== 'object' && a != null && b != null && String(a) === String(b));
}

function initialWords(setting) {
  return isEmpty(setting.initial) ? '' : `, ${Array.isArray(setting.initial) ? setting.initial.join(', ') : setting.initial}`;
}

/** What is allowed, where the field does not show it by itself. */
function rangeWords(setting, timeUnit) {
  const shows = ['choice', 'column', 'columns', 'flag'].includes(setting.kind);
  const range = timeUnit ? setting.range.replace(/time units$/, timeUnit).replace(/1\/time$/, `1/${timeUnit}`) : setting.range;
  return !shows && range ? `Allowed: ${range}.` : '';
}

/** The unit beside a field; times and rates are counted in that of the recording, where it is known. */
function unitWords(unit, timeUnit) {
  const time = timeUnit || 'time units';
  return {time, '1/time': timeUnit ? `1/${timeUnit}` : 'per time unit'}[unit] ?? unit;
}
