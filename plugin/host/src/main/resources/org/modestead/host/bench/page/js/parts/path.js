import {html} from '../../lib.js';
import {pathParts} from '../words.js';

/** The name of a file or folder; where there is no room for it, its middle is left out, not its end. */
export function Path({path}) {
  const {start, end} = pathParts(path);
  return html`<span class="path" title=${path}><span class="path-start">${start}</span><span class="path-end">${end}</span></span>`;
}
