import {html, useLayoutEffect, useRef} from '../lib.js';
import {counted} from '../js/words.js';
import {words} from './keys.js';
import {Pictures} from './pictures.js';
import {Port} from './port.js';
import {useRead} from './reading.js';
import {Callout, Report} from './report.js';
import {Verdict} from './verdict.js';
import {useWindowHeight} from './window-height.js';

/**
 * Everything that a step found: its sentences, its verdict, its doubts, its pictures, what every output holds, its settings.
 *
 * @param {object} given
 * @param {{id: string, look: boolean, resultId: string|null}} given.step of the desk
 * @param {string} given.selection what is selected on the whole page, for example `mode:3`; '' for nothing
 * @param {(key: string) => void} given.select
 */
export function Look({step, selection = '', select}) {
  const holds = useHeldFocus();
  const {value: look, fault} = useRead(step.look ? `/api/steps/${encodeURIComponent(step.id)}/look` : null, step.resultId ?? '');
  const place = useRef(null);
  useWindowHeight();
  useLayoutEffect(() => belowHead(place.current));
  if (!step.look) {
    return html`<div class="lk" data-look=${step.id} onfocusin=${holds}><p class="lk-quiet">${step.state?.kind === 'running'
      ? 'This step is running; what it finds is shown here when it is done.' : 'There is nothing to look at yet: this step has not run.'}</p></div>`;
  }
  if (fault) {
    return html`<div class="lk" data-look=${step.id} onfocusin=${holds}><p class="lk-fault" role="alert">${fault}</p></div>`;
  }
  if (!look) {
    return html`<div class="lk" data-look=${step.id} onfocusin=${holds}><p class="lk-quiet" role="status">Reading what this step found.</p></div>`;
  }
  const base = `/api/steps/${encodeURIComponent(step.id)}`;
  const shown = new Set(look.figures.map((figure) => figure.id));
  const parts = [
    look.verdict && {id: 'verdict', title: `Verdict: ${look.verdict.overall}`},
    look.doubts.length > 0 && {id: 'doubts', title: counted(look.doubts.length, 'doubt')},
    look.figures.length > 0 && {id: 'pictures', title: counted(look.figures.length, 'picture')},
    ...look.ports.filter((port) => !look.verdict || port.type !== 'verdict').map((port) => ({id: `port-${port.id}`, title: port.title})),
    look.settings.length > 0 && {id: 'settings', title: 'Settings'},
  ].filter(Boolean);
  const go = (id) => {
    const target = place.current?.querySelector(`#lk-${CSS.escape(id)}`);
    target?.scrollIntoView({block: 'start'});
    target?.focus({preventScroll: true});
  };
  const told = look.verdict ? [look.verdict.sentence, ...look.verdict.modes.map((mode) => mode.sentence)] : [];
  const sentences = look.sentences.filter((sentence) => !told.includes(sentence));
  const common = {resultId: look.resultId ?? step.resultId, selection, select};
  return html`<div class="lk" data-look=${step.id} ref=${place} onfocusin=${holds}>
    ${look.stale && html`<p class="lk-callout lk-caution" data-stale>Out of date: these results belong to other settings or inputs. Run the step again.</p>`}
    ${parts.length > 1 && html`<nav class="lk-parts" aria-label="Parts of what this step found">
      ${parts.map((part) => html`<button type="button" key=${part.id} class="lk-link" data-goes-to=${part.id} onClick=${() => go(part.id)}>${part.title}</button>`)}
      ${selection && html`<span class="lk-selected" role="status">selected: ${words(selection)}
        <button type="button" class="lk-button" data-action="clear-selection" onClick=${() => select('')}>clear (Esc)</button></span>`}
    </nav>`}
    ${sentences.length > 0 && html`<${Sentences} sentences=${sentences} />`}
    ${look.verdict && html`<div id="lk-verdict" tabindex="-1"><${Verdict} verdict=${look.verdict} selection=${selection} select=${select} /></div>`}
    ${look.doubts.length > 0 && html`<section id="lk-doubts" class="lk-doubts" tabindex="-1" aria-label="Doubts" data-doubts=${look.doubts.length}>
      <h3>${look.doubts.length === 1 ? 'A doubt' : 'Doubts'}</h3>
      <ul>${look.doubts.map((doubt, i) => html`<li key=${i} data-doubt=${doubt.code}>${doubt.sentence}</li>`)}</ul>
    </section>`}
    ${look.caution && html`<${Callout} tone="CAUTION" word="Caution" title="before these results are used" sentences=${[look.caution]} />`}
    ${look.document && html`<${Report} address=${`${base}/document`} file=${`${base}/report.html`} ...${common} />`}
    ${look.figures.length > 0 && html`<section id="lk-pictures" tabindex="-1" aria-label="Pictures"><h3 class="unseen">Pictures</h3>
      <${Pictures} figures=${look.figures} base=${`${base}/figures`} ...${common} />
    </section>`}
    ${look.ports.map((port) => html`<${Port} key=${port.id} step=${step.id} port=${port} shown=${shown} told=${look.verdict !== null} ...${common} />`)}
    ${look.settings.length > 0 && html`<${Settings} settings=${look.settings} />`}
  </div>`;
}

const FIRST_SENTENCES = 5;

/**
 * When what has the focus is drawn no more, because the step runs or found something else, the focus goes to the step's name above
 * instead of being lost.
 *
 * @returns {(event: FocusEvent) => void} to be told of every focus within
 */
function useHeldFocus() {
  const last = useRef(null);
  useLayoutEffect(() => {
    if (last.current && !last.current.isConnected) {
      last.current = null;
      if (document.activeElement === document.body) {
        document.querySelector('.look-title')?.focus({preventScroll: true});
      }
    }
  });
  return (event) => {
    last.current = event.target;
  };
}

/** What stays in sight at the top of the region, if anything, is told to the style sheet, so that the parts lie beneath it. */
function belowHead(element) {
  const head = element?.parentElement?.parentElement?.querySelector('.look-head');
  element?.style.setProperty('--lk-top', `${head ? head.offsetHeight : 0}px`);
}

/** The first sentences; the others are a press away. */
function Sentences({sentences}) {
  const short = sentences.length > FIRST_SENTENCES + 1;
  const paragraphs = (some) => some.map((sentence, i) => html`<p key=${i}>${sentence}</p>`);
  return html`<div class="lk-sentences">
    ${paragraphs(short ? sentences.slice(0, FIRST_SENTENCES) : sentences)}
    ${short && html`<details><summary>${sentences.length - FIRST_SENTENCES} more sentences</summary>
      <div class="lk-sentences">${paragraphs(sentences.slice(FIRST_SENTENCES))}</div></details>`}
  </div>`;
}

function Settings({settings}) {
  return html`<section id="lk-settings" tabindex="-1" aria-label="Settings it ran with" class="lk-settings">
    <h3>Settings it ran with</h3>
    <dl class="lk-facts">${settings.map((setting) => html`<div key=${setting.key} data-setting=${setting.key}>
      <dt>${setting.label}</dt><dd>${setting.value || 'not set'}${setting.unit ? ` ${setting.unit}` : ''}${setting.initial ? html` <span class="lk-quiet">(default)</span>` : ''}</dd>
    </div>`)}</dl>
  </section>`;
}
