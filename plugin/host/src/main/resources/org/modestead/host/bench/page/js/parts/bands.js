/** The bench itself: one band a stage, cards in rows, links between them. */
import {html, useEffect, useLayoutEffect, useRef, useState} from '../../lib.js';
import {getState} from '../store.js';
import {choose, moveStep} from '../actions.js';
import {nodeOf, stageTitle, stepWith} from '../catalog.js';
import {arrange, bandOf, widest} from '../layout.js';
import {Card} from './card.js';
import {Wires} from './wires.js';

const FEWEST = 3;

export function Bands() {
  const {catalog, desk, chosen, drag} = getState();
  const area = useRef(null);
  const [room, setRoom] = useState(FEWEST);
  useLayoutEffect(() => {
    const measure = () => setRoom(columnsIn(area.current));
    measure();
    const watch = new ResizeObserver(measure);
    watch.observe(area.current);
    return () => watch.disconnect();
  }, []);
  const places = desk.steps.map(({id, stage, place}) => ({id, stage, place}));
  const stages = catalog.stages.map((stage) => stage.id);
  const columns = Math.min(room, Math.max(FEWEST, widest(places, desk.links, stages)));
  const bands = arrange(places, desk.links, stages, columns);
  const order = bands.flatMap((band) => band.rows);
  const entry = chosen.at(-1) ?? order[0]?.[0]?.id;
  useReveal(area, chosen);
  const key = (event) => {
    const card = event.target.closest('[data-card]');
    if (card && !event.ctrlKey && !event.metaKey && !event.altKey) {
      walk(event, order, card.dataset.card);
    }
  };
  const clear = (event) => {
    if (!event.target.closest('[data-step], [data-link], button')) {
      choose([]);
    }
  };
  return html`<div class=${'bands' + (desk.steps.length ? '' : ' bare')} ref=${area}
      style=${{'--columns': String(columns)}} onkeydown=${key} onclick=${clear}>
    <${Wires} area=${area} />
    ${bands.map((band) => html`<${Band} key=${band.stage} band=${band} entry=${entry} catalog=${catalog} desk=${desk} drag=${drag} />`)}
  </div>`;
}

/** @returns {number} how many cards of the least width stand side by side */
function columnsIn(element) {
  const style = getComputedStyle(element);
  const size = (name) => parseFloat(style.getPropertyValue(name)) * parseFloat(getComputedStyle(document.documentElement).fontSize);
  const width = element.clientWidth - size('--stage-width') - size('--bands-end');
  return Math.max(1, Math.floor((width + size('--card-gap')) / (size('--card-width') + size('--card-gap'))));
}

function Band({band, entry, catalog, desk, drag}) {
  const title = stageTitle(catalog, band.stage);
  const steps = new Map(desk.steps.map((step) => [step.id, step]));
  const wanted = drag?.kind === 'node' && nodeOf(catalog, drag.node).stage === band.stage;
  const own = drag?.kind === 'step' && steps.get(drag.step)?.stage === band.stage;
  const empty = band.rows.length === 0;
  return html`<section class=${'band' + (empty ? ' empty' : '') + (wanted || own ? ' wanted' : '')} data-band=${band.stage}
      aria-label=${`${title}, ${empty ? 'no step yet' : told(band.rows.flat().length)}`}>
    <h2 class="band-title">${title}</h2>
    ${empty
      ? html`<p class="band-hint">${wanted ? 'Drop it here' : hint(band.stage)}</p>`
      : html`<div class="band-rows">${band.rows.map((row, i) => html`<ul class="card-row" key=${i} data-row aria-label=${`${title}, row ${i + 1}`}>
        ${row.map(({id, column}) => html`<${Card} key=${id} step=${steps.get(id)} column=${column} first=${id === entry} />`)}
      </ul>`)}</div>`}
  </section>`;
}

const HINTS = {
  data: 'Tables come in here',
  prepare: 'Tables become snapshots here',
  fit: 'The operator is fitted here',
  judge: 'Modes are found and judged here',
  forecast: 'The recording is carried on here',
  report: 'Results are handed on here',
};

function told(count) {
  return count === 1 ? '1 step' : `${count} steps`;
}

function hint(stage) {
  return HINTS[stage] ?? '';
}

function walk(event, order, id) {
  const row = order.findIndex((cards) => cards.some((card) => card.id === id));
  const cards = order[row];
  const at = cards.findIndex((card) => card.id === id);
  const near = (target) => target && target.reduce((best, card) => (
    Math.abs(card.column - cards[at].column) < Math.abs(best.column - cards[at].column) ? card : best));
  const next = {
    ArrowLeft: cards[at - 1], ArrowRight: cards[at + 1], ArrowUp: near(order[row - 1]), ArrowDown: near(order[row + 1]),
    Home: order[0][0], End: order.at(-1).at(-1),
  }[event.key];
  if (event.shiftKey && (event.key === 'ArrowLeft' || event.key === 'ArrowRight')) {
    event.preventDefault();
    shift(id, event.key === 'ArrowLeft' ? -1 : 1);
  } else if (next && !event.shiftKey) {
    event.preventDefault();
    choose([next.id]);
    focusCard(next.id);
  }
}

/** Puts the focus on a step, once it is there. @param {string} id */
export function focusCard(id) {
  setTimeout(() => document.querySelector(`[data-card="${CSS.escape(id)}"]`)?.focus(), 0);
}

/** Where a step would stand in its band after a move, -1 where it cannot move so. */
function placeAfter(desk, step, by) {
  const band = bandOf(desk.steps, step.stage);
  const place = band.findIndex((s) => s.id === step.id) + by;
  return place < band.length ? place : -1;
}

/** @returns {boolean} whether a step has a neighbour in its band on that side */
export function canShift(desk, step, by) {
  return placeAfter(desk, step, by) >= 0;
}

/** Moves a step before or behind its neighbour in the band. @param {string} id @param {-1|1} by */
export async function shift(id, by) {
  const {desk} = getState();
  const place = placeAfter(desk, stepWith(desk, id), by);
  if (place >= 0) {
    await moveStep(id, place);
    focusCard(id);
  }
}

/** Brings a newly chosen step into sight. */
function useReveal(area, chosen) {
  const id = chosen.at(-1);
  useEffect(() => {
    const card = id && area.current?.querySelector(`[data-step="${CSS.escape(id)}"]`);
    card?.scrollIntoView({block: 'nearest', inline: 'nearest'});
  }, [id]);
}
