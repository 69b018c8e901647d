/** A field whose text is the person's own until it is handed on: what the server tells meanwhile does not overwrite it. */
import {html, useEffect, useRef, useState} from '../../lib.js';

/**
 * @param {object} props
 * @param {string} props.value what holds now
 * @param {(text: string) => any} props.put takes the text when the field is left, or after a pause in typing
 * @param {boolean} [props.area] several lines
 * @param {number} [props.pause] in milliseconds; without, only when the field is left
 * All other properties go to the control.
 */
export function Draft({value, put, area, pause, ...attributes}) {
  const [draft, setDraft] = useState(null);
  const latest = useRef({});
  const handed = useRef(null);
  const control = useRef(null);
  latest.current = {draft, value, put};
  const hand = () => {
    const {draft: text, value: held, put: take} = latest.current;
    if (text !== null && text !== held && text !== handed.current) {
      handed.current = text;
      take(text);
    }
  };
  useEffect(() => {
    if (draft === null || !pause) {
      return undefined;
    }
    const timer = setTimeout(hand, pause);
    return () => clearTimeout(timer);
  }, [draft]);
  useEffect(() => {
    handed.current = null;
    if (draft === value || document.activeElement !== control.current) {
      setDraft(null);
    }
  }, [value]);
  useEffect(() => hand, []);
  const own = {...attributes, ref: control, value: draft ?? value, oninput: (e) => setDraft(e.target.value), onblur: hand, onchange: hand};
  return area ? html`<textarea ...${own}></textarea>` : html`<input ...${own} />`;
}
