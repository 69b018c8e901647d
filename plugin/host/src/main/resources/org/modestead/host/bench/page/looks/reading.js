import {useEffect, useState} from '../lib.js';

/** Answers that were read, by address and result: a result never changes, so neither do they. */
const kept = new Map();
const MOST = 400;

/**
 * Reads JSON from the bench's server.
 * @param {string} address
 * @returns {Promise<any>} rejected with an Error whose message is a sentence for people
 */
export async function read(address) {
  let response;
  try {
    response = await fetch(address, {headers: {Accept: 'application/json'}});
  } catch {
    throw new Error('The server of the bench does not answer. If it was stopped, start it again; nothing is lost.');
  }
  if (!response.ok) {
    const told = await response.json().catch(() => null);
    throw new Error(told?.error?.sentence ?? `The server of the bench refused with ${response.status}.`);
  }
  return response.json();
}

/** Reads JSON once a result; {@link read} otherwise. */
export function readOnce(address, resultId) {
  const key = `${resultId} ${address}`;
  if (!kept.has(key)) {
    if (kept.size >= MOST) {
      kept.delete(kept.keys().next().value);
    }
    const answer = read(address);
    kept.set(key, answer);
    answer.catch(() => kept.delete(key));
  }
  return kept.get(key);
}

/**
 * @param {string|null} address null reads nothing yet
 * @param {string} resultId of the result that it tells about
 * @returns {{value: any, fault: string}} value null until it is there
 */
export function useRead(address, resultId) {
  const [state, setState] = useState({address: null, value: null, fault: ''});
  const key = `${resultId} ${address}`;
  useEffect(() => {
    if (!address) {
      return undefined;
    }
    let wanted = true;
    readOnce(address, resultId).then(
      (value) => wanted && setState({address: key, value, fault: ''}),
      (fault) => wanted && setState({address: key, value: null, fault: fault.message}),
    );
    return () => {
      wanted = false;
    };
  }, [key]);
  return state.address === key ? state : {value: null, fault: ''};
}
