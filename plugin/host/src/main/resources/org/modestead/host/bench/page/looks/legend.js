import {html} from '../lib.js';
import {Mark} from './marks.js';
import {layerStyles} from './styles.js';

/** The names of a picture's layers with what each looks like; a press hides or shows one. */
export function Legend({figure, theme, hidden, setHidden}) {
  const styles = layerStyles(figure, theme);
  const named = new Map();
  for (const layer of figure.layers) {
    if (layer.name && layer.type !== 'rule' && !named.has(layer.name)) {
      named.set(layer.name, layer);
    }
  }
  if (named.size === 0) {
    return null;
  }
  const toggle = (name) => {
    const next = new Set(hidden);
    if (!next.delete(name)) {
      next.add(name);
    }
    setHidden(next);
  };
  return html`<ul class="lk-legend" aria-label="What is drawn; press to hide or show">
    ${[...named].map(([name, layer]) => html`<li key=${name}>
      <button type="button" class="lk-name" aria-pressed=${String(!hidden.has(name))} onClick=${() => toggle(name)}>
        <${Sign} layer=${layer} styles=${styles} theme=${theme} />${name}
      </button>
    </li>`)}
  </ul>`;
}

function Sign({layer, styles, theme}) {
  const colour = styles.colour(layer);
  if (layer.type === 'points') {
    return html`<${Mark} mark=${layer.mark} colour=${colour} />`;
  }
  if (layer.type === 'bars' || layer.type === 'band') {
    return html`<svg class="lk-sign" viewBox="0 0 16 16" aria-hidden="true" focusable="false">
      <rect x="1" y="3" width="14" height="10" fill=${colour} fill-opacity=${layer.type === 'band' ? theme.band * 1.4 : 1} />
    </svg>`;
  }
  const mark = styles.isMarked(layer) ? html`<svg x="6" y="0" width="16" height="16"><${Mark} mark=${styles.curveMark(layer)} colour=${colour} /></svg>` : null;
  return html`<svg class="lk-sign lk-sign-line" viewBox="0 0 28 16" aria-hidden="true" focusable="false">
    <line x1="0" y1="8" x2="28" y2="8" stroke=${colour} stroke-width=${layer.type === 'backdrop' ? 1.4 : styles.width(layer)}
      stroke-dasharray=${styles.dash(layer).join(' ') || null} />${mark}
  </svg>`;
}
