/** The one place that holds what the page knows. Components read it with `useStore`; only actions change it. */
import {useEffect, useReducer} from '../lib.js';

/**
 * @typedef {object} State
 * @property {object|null} catalog stages, types and nodes, as the server declares them
 * @property {object|null} desk the state of the desk as the server last told it
 * @property {string[]} chosen ids of the chosen steps; the last one is the one that is looked at
 * @property {string} link the chosen link as `from>to`, '' for none
 * @property {string} selection what is marked in all pictures, such as `mode:3`, '' for none
 * @property {object|null} dialog which dialog is open, `{kind, ...}`
 * @property {object|null} drag what is being dragged, `{kind, ...}`
 * @property {{steps: object[], links: object[], desk: string}|null} clip what was copied
 * @property {boolean} wide whether the look fills the page
 * @property {{tone: string, text: string, id: number}|null} notice a message that stays until it is closed or replaced
 * @property {string} said what a screen reader is told
 * @property {object|null} start what the start page offers, as the server told it with the page; null when it is to be asked for
 * @property {object|null} guess a recording that was brought on the start page, as the server guesses it
 * @property {boolean} lost whether the server no longer answers
 */

/** @type {State} */
let state = {
  catalog: null,
  desk: null,
  chosen: [],
  link: '',
  selection: '',
  dialog: null,
  drag: null,
  clip: null,
  wide: false,
  notice: null,
  said: '',
  start: null,
  guess: null,
  lost: false,
};

const listeners = new Set();

/** @returns {State} */
export function getState() {
  return state;
}

/** @param {Partial<State>} change */
export function setState(change) {
  state = {...state, ...change};
  for (const listener of [...listeners]) {
    listener();
  }
}

/** Rerenders the component whenever what the page knows changes. @returns {State} */
export function useStore() {
  const [, again] = useReducer((n) => n + 1, 0);
  useEffect(() => {
    listeners.add(again);
    return () => listeners.delete(again);
  }, []);
  return state;
}
