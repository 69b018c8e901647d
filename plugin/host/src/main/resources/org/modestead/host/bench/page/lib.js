/**
 * The one door to the library: virtual nodes, hooks and the template tag. The library itself is loaded by index.html as two
 * plain scripts, so that there is one copy of it on the page.
 */
import {templateTag} from './html.js';

const {h, render} = globalThis.preact;
const {useState, useEffect, useLayoutEffect, useRef, useMemo, useReducer, useId, useErrorBoundary} = globalThis.preactHooks;

export const html = templateTag(h);
export {render, useState, useEffect, useLayoutEffect, useRef, useMemo, useReducer, useId, useErrorBoundary};
