/** Between bench and look: dragged or moved with the arrow keys; remembered on this machine. */
import {html, useEffect, useRef, useState} from '../../lib.js';

const LEAST = 25;
const MOST = 75;

/** On a wide screen the bench needs a smaller share of it. */
function usual() {
  return window.innerWidth < 1600 ? 51 : 43;
}

function remembered() {
  const kept = Number(window.modesteadPage.kept('split'));
  return kept >= LEAST && kept <= MOST ? kept : usual();
}

export function Splitter() {
  const [share, setShare] = useState(remembered);
  const bar = useRef(null);
  useEffect(() => {
    bar.current.closest('.room').style.setProperty('--bench-share', String(share));
    if (share !== usual()) {
      window.modesteadPage.keep('split', String(share));
    }
  }, [share]);
  const put = (value) => setShare(Math.round(Math.min(MOST, Math.max(LEAST, value))));
  const drag = (event) => {
    const room = bar.current.closest('.room').getBoundingClientRect();
    const shelf = document.querySelector('.shelf').getBoundingClientRect();
    bar.current.setPointerCapture(event.pointerId);
    bar.current.onpointermove = (e) => put(((e.clientX - shelf.right) / (room.right - shelf.right)) * 100);
    bar.current.onlostpointercapture = () => {
      bar.current.onpointermove = null;
    };
  };
  const key = (event) => {
    const by = {ArrowLeft: -2, ArrowRight: 2}[event.key];
    if (by) {
      event.preventDefault();
      put(share + by);
    } else if (event.key === 'Home' || event.key === 'End') {
      event.preventDefault();
      put(event.key === 'Home' ? LEAST : MOST);
    }
  };
  return html`<div class="splitter" ref=${bar} role="separator" tabindex="0" aria-orientation="vertical" aria-label="Width of the bench" aria-valuenow=${share}
    aria-valuemin=${LEAST} aria-valuemax=${MOST} data-action="split" onpointerdown=${drag} onkeydown=${key} ondblclick=${() => put(usual())}></div>`;
}
