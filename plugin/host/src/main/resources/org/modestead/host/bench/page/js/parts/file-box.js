/** Files of the opened folders, to choose from. */
import {html, useEffect, useState} from '../../lib.js';
import {api} from '../api.js';
import {Glyph} from '../glyphs.js';
import {bytes} from '../words.js';
import {Path} from './path.js';

/**
 * @param {object} props
 * @param {string[]} props.extensions only files that end so; empty for all
 * @param {string} props.label
 * @param {string} [props.folder] where to begin
 * @param {(entry: {path: string, name: string, relative: string|null}) => void} props.pick
 * @param {(folder: string) => void} [props.moved] told which folder is shown
 */
export function FileBox({extensions, label, folder: start = '', pick, moved}) {
  const [folder, setFolder] = useState(start);
  const [listing, setListing] = useState(null);
  const [fault, setFault] = useState('');
  useEffect(() => {
    const stop = new AbortController();
    api.get('/api/files' + (folder ? `?folder=${encodeURIComponent(folder)}` : ''), stop.signal).then((answer) => {
      setListing(answer);
      setFault('');
      moved?.(answer.folder ?? '');
    }).catch((problem) => problem.name !== 'AbortError' && setFault(problem.message));
    return () => stop.abort();
  }, [folder]);
  if (fault) {
    return html`<div class="file-box"><p class="tone-stop">${fault}</p>
      ${folder && html`<button type="button" class="button" onclick=${() => setFolder('')}>Back to the opened folders</button>`}</div>`;
  }
  if (!listing) {
    return html`<div class="file-box" aria-busy="true"><p class="quiet">Reading the folder.</p></div>`;
  }
  const fits = (entry) => entry.folder || extensions.length === 0 || extensions.some((end) => entry.name.toLowerCase().endsWith('.' + end));
  const entries = listing.folder ? listing.entries.filter(fits) : listing.roots.map((root) => ({name: root.title, path: root.path, folder: true}));
  return html`<div class="file-box" role="group" aria-label=${label}>
    <p class="file-where small"><span class="clip">${listing.folder ? html`<${Path} path=${listing.folder} />` : 'Opened folders'}</span>
      ${listing.folder && html`<button type="button" class="link-button" data-action="folder-up" onclick=${() => setFolder(listing.parent ?? '')}>
        ${listing.parent ? 'Up' : 'Opened folders'}</button>`}</p>
    <ul class="file-list">${entries.map((entry) => html`<li key=${entry.path}><button type="button" class="file-item" data-file=${entry.name}
      onclick=${() => (entry.folder ? setFolder(entry.path) : pick(entry))}><${Glyph} name=${entry.folder ? 'folder' : 'file'} />
      <span class="clip grow">${listing.folder ? entry.name : html`<${Path} path=${entry.name} />`}</span>${!entry.folder && html`<span class="quiet small">${bytes(entry.bytes)}</span>`}</button></li>`)}</ul>
    ${entries.length === 0 && html`<p
      class="quiet small">Nothing here${extensions.length ? ` that ends in ${extensions.map((e) => '.' + e).join(', ')}` : ''}.</p>`}
    ${listing.cut && html`<p class="quiet small">Only the first entries are shown.</p>`}
  </div>`;
}
