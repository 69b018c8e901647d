import {useEffect, useState} from '../lib.js';
import {api} from '../js/api.js';

/** Answers that were read, by address and result: a result never changes, so neither do they. */
const kept = new Map();
const MOST = 400;

/** Reads JSON once a result. */
function readOnce(address, resultId) {
  const key = `${resultId} ${address}`;
  if (!kept.has(key)) {
    if (kept.size >= MOST) {
      kept.delete(kept.keys().next().value);
    }
    const answer = api.get(address);
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
