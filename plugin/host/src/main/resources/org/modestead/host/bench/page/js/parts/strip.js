/** The line at the foot of the page: how the run goes, and what the chosen link is. */
import {html} from '../../lib.js';
import {getState} from '../store.js';
import {choose, unlink} from '../actions.js';
import {endWords} from '../catalog.js';
import {counted} from '../words.js';

export function Strip() {
  const {catalog, desk, link, lost, chosen} = getState();
  const [from, to] = link.split('>');
  const run = desk.run;
  const failed = desk.steps.find((step) => step.state.kind === 'failed');
  return html`<footer class="strip small">
    ${run.running && html`<progress class="strip-progress" max="1" value=${run.fraction ?? undefined} aria-label="Progress of the run"></progress>`}
    <span class="strip-run" data-run=${run.running ? 'running' : 'idle'}>${runWords(desk)}</span>
    ${failed && !run.running && html`<button type="button" class="link-button" data-action="show-failed"
      onclick=${() => choose([failed.id])}>Show what failed</button>`}
    <span class="grow"></span>
    ${lost && html`<strong class="tone-stop">The bench does not answer; trying again.</strong>`}
    ${link && html`<span class="clip">Link: ${endWords(catalog, desk, from, true)} to ${endWords(catalog, desk, to, false)}</span>
      <button type="button" class="link-button" data-action="unlink" onclick=${() => unlink(from, to)}>Remove the link</button>`}
    ${!link && html`<span class="quiet">${chosen.length > 1 ? counted(chosen.length, 'step') + ' chosen' : counted(desk.steps.length, 'step')}</span>`}
  </footer>`;
}

function runWords(desk) {
  if (desk.run.running) {
    return capital(desk.run.words);
  }
  return desk.run.last || (desk.steps.length ? 'Not running' : 'The bench is empty: drag a step from the shelf, or press Enter on one.');
}

function capital(text) {
  return text ? text[0].toUpperCase() + text.slice(1) : '';
}
