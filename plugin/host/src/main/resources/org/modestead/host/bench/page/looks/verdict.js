import {html, useState} from '../lib.js';
import {unparted} from '../js/words.js';
import {isSelected, words} from './keys.js';
import {GRADE_MARKS, Mark} from './marks.js';
import {cell} from './numbers.js';

/** A verdict in plain words: what may be said of every mode, what decided it, what may be done. */
export function Verdict({verdict, selection, select}) {
  const counted = verdict.modes.filter((mode) => mode.counts);
  const others = verdict.modes.filter((mode) => !mode.counts);
  return html`<section class="lk-verdict" data-verdict=${verdict.overall} aria-label="Verdict">
    <p class="lk-overall"><${Mark} mark=${GRADE_MARKS[verdict.overall]} /> ${verdict.headline}</p>
    <p>${verdict.meaning} ${verdict.advice}</p>
    ${verdict.driven && html`<p class="lk-quiet" data-driven>${verdict.driven}</p>`}
    ${counted.length > 0 && html`<${Modes} title="Modes that carry the signal" modes=${counted} selection=${selection} select=${select} />`}
    ${counted.length === 0 && html`<p>${verdict.sentence}</p>`}
    ${others.length > 0 && html`<details data-action="other-modes" open=${others.some((mode) => isSelected(mode.selection, selection)) || null}>
      <summary>${others.length === 1 ? 'One further mode carries' : `${others.length} further modes carry`} too little of the signal to count</summary>
      <${Modes} title="Modes that do not count" modes=${others} selection=${selection} select=${select} />
    </details>`}
    ${verdict.whole.length > 0 && html`<details data-action="whole">
      <summary>The operator as a whole: ${verdict.whole.length === 1 ? 'one finding' : `${verdict.whole.length} findings`}</summary>
      <${Findings} findings=${verdict.whole} />
    </details>`}
  </section>`;
}

function Modes({title, modes, selection, select}) {
  return html`<ul class="lk-modes" aria-label=${title}>
    ${modes.map((mode) => html`<${Mode} key=${mode.mode} mode=${mode} chosen=${isSelected(mode.selection, selection)} select=${select} />`)}
  </ul>`;
}

function Mode({mode, chosen, select}) {
  const [open, setOpen] = useState(false);
  return html`<li class=${chosen ? 'lk-chosen' : ''} data-row-mode=${mode.mode} data-grade=${mode.grade}>
    <div class="lk-mode">
      <button type="button" class="lk-select" aria-pressed=${String(chosen)} data-action="select-mode"
          title=${`Select ${words(mode.selection)} everywhere`} onClick=${() => select(chosen ? '' : mode.selection)}>
        <${Mark} mark=${GRADE_MARKS[mode.grade]} /> Mode ${mode.mode} <strong>${mode.grade}</strong>
      </button>
      ${mode.deciding.length > 0 && html`<button type="button" class="lk-button" data-action="why" aria-expanded=${String(open)}
        aria-label=${`what decided it, mode ${mode.mode}`} onClick=${() => setOpen(!open)}>what decided it</button>`}
    </div>
    ${mode.figures && html`<p class="lk-figures">${unparted(mode.figures)}</p>`}
    <p>${mode.meaning} ${mode.advice}</p>
    ${!open && mode.deciding.length > 0 && html`<p class="lk-quiet">Decided by: ${mode.deciding.map((one) => one.name.toLowerCase()).join(', ')}.</p>`}
    ${open && html`<${Findings} findings=${mode.deciding} />`}
    ${mode.deciding.length === 0 && html`<p>${mode.sentence}</p>`}
  </li>`;
}

function Findings({findings}) {
  return html`<ul class="lk-findings">
    ${findings.map((finding) => html`<li key=${finding.check} data-check=${finding.check} data-outcome=${finding.outcome}>
      <strong>${finding.name}</strong>: ${finding.outcome}${figures(finding)}. ${finding.sentence}</li>`)}
  </ul>`;
}

function figures(finding) {
  if (finding.value === null) {
    return '';
  }
  return ` (${cell(finding.value)}${finding.threshold === null ? '' : `, threshold ${cell(finding.threshold)}`})`;
}
