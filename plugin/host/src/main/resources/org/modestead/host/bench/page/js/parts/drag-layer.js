/** What follows the pointer during a drag: the name of what is held, a line for links, and what a drop would do. */
import {html, useEffect, useRef} from '../../lib.js';
import {useStore} from '../store.js';
import {nodeOf, stepWith, portAt} from '../catalog.js';

export function DragLayer() {
  const {drag, catalog, desk} = useStore();
  const ghost = useRef(null);
  const line = useRef(null);
  const going = Boolean(drag);
  useEffect(() => {
    if (!going) {
      return undefined;
    }
    const from = drag.kind === 'port' ? portPoint(drag) : null;
    const follow = ({clientX: x, clientY: y}) => {
      if (ghost.current) {
        const left = Math.min(x + 14, window.innerWidth - ghost.current.offsetWidth - 8);
        const top = Math.min(y + 18, window.innerHeight - ghost.current.offsetHeight - 8);
        ghost.current.style.transform = `translate(${left}px, ${top}px)`;
      }
      line.current?.setAttribute('d', from ? `M${from.x} ${from.y}L${x} ${y}` : '');
    };
    follow({clientX: drag.start.x, clientY: drag.start.y});
    window.addEventListener('pointermove', follow);
    return () => window.removeEventListener('pointermove', follow);
  }, [going]);
  if (!drag) {
    return null;
  }
  return html`<div class="drag-layer" aria-hidden="true">
    <svg class="drag-line"><path ref=${line} /></svg>
    <div class=${'drag-ghost' + (drag.refused ? ' refused' : '')} ref=${ghost}>
      <strong>${nameOf(drag, catalog, desk)}</strong>
      ${drag.words && html`<span data-drag-words>${drag.refused ? 'Not here: ' : ''}${drag.words}</span>`}
    </div>
  </div>`;
}

function portPoint(drag) {
  const tab = document.querySelector(`[data-port="${CSS.escape(drag.end)}"][data-side="${drag.output ? 'output' : 'input'}"]`);
  const box = tab?.getBoundingClientRect();
  return box ? {x: box.left + box.width / 2, y: box.top + box.height / 2} : drag.start;
}

function nameOf(drag, catalog, desk) {
  if (drag.kind === 'node') {
    return nodeOf(catalog, drag.node).title;
  }
  return drag.kind === 'step' ? stepWith(desk, drag.step)?.title : portAt(catalog, desk, drag.end, drag.output)?.port.title;
}
