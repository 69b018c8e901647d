/** Talks to the server of the bench. Answers are JSON; a refusal is thrown as an `ApiFault` whose message is one sentence. */

export class ApiFault extends Error {
  /**
   * @param {number} status of the answer, 0 when there was none
   * @param {string} sentence for people
   */
  constructor(status, sentence) {
    super(sentence);
    this.status = status;
  }
}

const SILENT = 'The bench does not answer: its program has ended or was stopped. Start it again; nothing is lost.';

async function ask(path, options) {
  let answer;
  try {
    answer = await fetch(path, {credentials: 'same-origin', cache: 'no-store', ...options});
  } catch (fault) {
    if (fault.name === 'AbortError') {
      throw fault;
    }
    throw new ApiFault(0, SILENT);
  }
  const text = await answer.text();
  if (!answer.ok) {
    throw faultOf(answer.status, text);
  }
  return text ? JSON.parse(text) : null;
}

function faultOf(status, text) {
  try {
    return new ApiFault(status, JSON.parse(text).error.sentence);
  } catch {
    return new ApiFault(status, status === 401
      ? 'This page has no key to the bench: open the address that the command printed.'
      : `The bench answered with ${status} and no reason.`);
  }
}

export const api = {
  /**
   * @param {string} path
   * @param {AbortSignal} [signal]
   */
  get: (path, signal) => ask(path, {signal}),

  /**
   * @param {string} path
   * @param {object} [body] sent as JSON
   * @param {AbortSignal} [signal]
   */
  post: (path, body = {}, signal) => ask(path, {
    method: 'POST',
    headers: {'Content-Type': 'application/json', 'X-Modestead': 'bench'},
    body: JSON.stringify(body),
    signal,
  }),

  /** @param {File} file */
  upload: (file) => ask(`/api/upload?name=${encodeURIComponent(file.name)}`, {
    method: 'POST',
    headers: {'Content-Type': 'application/octet-stream', 'X-Modestead': 'bench'},
    body: file,
  }),
};
