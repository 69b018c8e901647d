import {useEffect, useState} from '../lib.js';
import {api} from '../js/api.js';
import {prose, unparted} from '../js/words.js';

/** Answers that were read, by address and result: a result never changes, so neither do they. */
const kept = new Map();
const MOST = 400;

/** Where an answer holds words for people. */
const WORDS = new Set(['sentence', 'sentences', 'caption', 'text', 'items', 'value', 'advice', 'meaning', 'headline', 'figures', 'note', 'whole', 'rows']);

/** The same answer with numbers in sentences as the page writes them, none parted from its unit. */
function told(value, key) {
  if (typeof value === 'string') {
    return WORDS.has(key) ? unparted(prose(value)) : value;
  }
  if (Array.isArray(value)) {
    return typeof value[0] === 'number' ? value : value.map((entry) => told(entry, key));
  }
  return value && typeof value === 'object' ? Object.fromEntries(Object.entries(value).map(([name, entry]) => [name, told(entry, name)])) : value;
}

/** Reads JSON once a result. */
function readOnce(address, resultId) {
  const key = `${resultId} ${address}`;
  if (!kept.has(key)) {
    if (kept.size >= MOST) {
      kept.delete(kept.keys().next().value);
    }
    const answer = api.get(address).then((value) => told(value, ''));
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
