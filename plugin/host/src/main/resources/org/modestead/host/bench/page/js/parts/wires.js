/** The links, drawn behind the cards; those of the chosen step or link stand out. */
import {html, useEffect, useLayoutEffect, useRef, useState} from '../../lib.js';
import {getState} from '../store.js';
import {chooseLink, linkKey} from '../actions.js';
import {stepOf} from '../layout.js';
import {routes} from '../routes.js';

/** @param {{area: {current: HTMLElement}}} props the element that holds bands and cards */
export function Wires({area}) {
  const {desk, chosen, link} = getState();
  const [drawn, setDrawn] = useState(new Map());
  const last = useRef('');
  const draw = () => {
    const plan = measure(area.current, getState().desk.links);
    const now = JSON.stringify(plan);
    if (now !== last.current) {
      last.current = now;
      setDrawn(routes(plan.links, plan.rows, plan.gutters));
    }
  };
  useLayoutEffect(draw);
  useEffect(() => {
    const watch = new ResizeObserver(draw);
    watch.observe(area.current);
    return () => watch.disconnect();
  }, []);
  const shown = desk.links.filter((l) => drawn.has(linkKey(l)));
  const strong = (l) => linkKey(l) === link || (!link && (chosen.includes(stepOf(l.from)) || chosen.includes(stepOf(l.to))));
  const ordered = [...shown.filter((l) => !strong(l)), ...shown.filter(strong)];
  return html`<svg class="wires" aria-hidden="true">
    ${ordered.map((l) => {
      const key = linkKey(l);
      const d = drawn.get(key);
      return html`<g key=${key} class=${'wire' + (strong(l) ? ' strong' : '') + (key === link ? ' chosen' : '')} data-link=${key}
          onclick=${() => chooseLink(key)}>
        <path class="wire-reach" d=${d} /><path class="wire-line" d=${d} />
      </g>`;
    })}
  </svg>`;
}

/** Where rows, gutters and the ends of links are, relative to the element. */
function measure(area, links) {
  const origin = area.getBoundingClientRect();
  const rows = [...area.querySelectorAll('[data-row]')];
  const rowOf = new Map();
  const edges = rows.map((row, index) => {
    const cards = [...row.querySelectorAll('[data-step]')];
    cards.forEach((card) => rowOf.set(card.dataset.step, index));
    const boxes = cards.map((card) => card.getBoundingClientRect());
    return {
      top: Math.round(Math.min(...boxes.map((box) => box.top)) - origin.top),
      bottom: Math.round(Math.max(...boxes.map((box) => box.bottom)) - origin.top),
    };
  });
  const tracks = new Map();
  const ends = [];
  for (const link of links) {
    const from = endOf(area, origin, link.from, 'output');
    const to = endOf(area, origin, link.to, 'input');
    const fromRow = rowOf.get(stepOf(link.from));
    const toRow = rowOf.get(stepOf(link.to));
    if (from && to && fromRow !== undefined && toRow !== undefined) {
      if (!tracks.has(link.from)) {
        tracks.set(link.from, tracks.size);
      }
      ends.push({key: linkKey(link), from: {...from, row: fromRow}, to: {...to, row: toRow}, track: tracks.get(link.from)});
    }
  }
  return {links: ends, rows: edges, gutters: guttersOf(rows[0], origin)};
}

/** Where a link meets the edge of its card: at its tab, or, where tabs stand in several lines, at a point of its own. */
function endOf(area, origin, end, side) {
  const tab = area.querySelector(`[data-port="${CSS.escape(end)}"][data-side="${side}"]`);
  if (!tab) {
    return undefined;
  }
  const card = tab.closest('[data-step]').getBoundingClientRect();
  const box = tab.getBoundingClientRect();
  const tabs = [...tab.closest('.ports').querySelectorAll('.tab.linked, .tab.fits')];
  const lines = new Set(tabs.map((other) => Math.round(other.getBoundingClientRect().top)));
  const across = lines.size > 1
    ? card.left + (card.width * (tabs.indexOf(tab) + 1)) / (tabs.length + 1)
    : box.left + box.width / 2;
  return {x: Math.round(across - origin.left), y: Math.round((side === 'output' ? card.bottom : card.top) - origin.top)};
}

/** The middle of the room left of each column and right of the last. */
function guttersOf(row, origin) {
  if (!row) {
    return [];
  }
  const style = getComputedStyle(row);
  const gap = parseFloat(style.columnGap) || 0;
  let x = row.getBoundingClientRect().left - origin.left;
  const middles = [x - gap / 2];
  for (const width of style.gridTemplateColumns.split(' ').map(parseFloat)) {
    x += width + gap;
    middles.push(x - gap / 2);
  }
  return middles.map(Math.round);
}
