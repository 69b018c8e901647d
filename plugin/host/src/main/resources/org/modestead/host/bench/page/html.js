/**
 * A template tag that turns markup into virtual nodes: html`<p class=${name}>Hello ${who}</p>`.
 *
 * Components stand in the place of a tag: html`<${Card} step=${step} />`. Every element is closed (`<br />`, `</p>`, `<//>`).
 * A template is read once; what stands in its slots is put in at every call and never read as markup, so data cannot become
 * elements. Several roots give a list.
 *
 * @param {(type: any, properties: object|null, ...children: any[]) => any} make the maker of virtual nodes
 * @returns {(strings: TemplateStringsArray, ...slots: any[]) => any} the tag
 */
export function templateTag(make) {
  const read = new WeakMap();
  return (strings, ...slots) => {
    let roots = read.get(strings);
    if (!roots) {
      roots = parse(strings);
      read.set(strings, roots);
    }
    const made = roots.map((node) => build(node, slots, make));
    return made.length > 1 ? made : made[0];
  };
}

/** Marks a slot in the joined text; a character that no template holds. */
const SLOT = '\uE000';

function parse(strings) {
  const text = strings.join(SLOT);
  let at = 0;
  let slot = 0;
  const root = {children: []};
  const open = [root];
  const isBlank = (c) => c === ' ' || c === '\n' || c === '\t' || c === '\r';
  const isUnquotedEnd = (c, next) => isBlank(c) || c === '>' || (c === '/' && next === '>');
  const skipBlanks = () => {
    while (at < text.length && isBlank(text[at])) {
      at += 1;
    }
  };
  const fail = (what) => {
    throw new Error(`Template: ${what} near "${text.slice(Math.max(0, at - 30), at + 30)}"`);
  };
  /** Reads up to one of the ends: a plain text, a slot, or parts to be joined. */
  const value = (isEnd) => {
    const parts = [];
    let start = at;
    const flush = () => {
      if (at > start) {
        parts.push(text.slice(start, at));
      }
    };
    while (at < text.length && !isEnd(text[at], text[at + 1])) {
      if (text[at] === SLOT) {
        flush();
        parts.push({slot: slot++});
        start = at + 1;
      }
      at += 1;
    }
    flush();
    return parts.length === 0 ? '' : parts.length === 1 ? parts[0] : {joined: parts};
  };
  const content = () => {
    let start = at;
    const flush = () => {
      const piece = text.slice(start, at).replace(/^\s*\n\s*|\s*\n\s*$/g, '');
      if (piece) {
        open.at(-1).children.push(piece);
      }
    };
    while (at < text.length && text[at] !== '<') {
      if (text[at] === SLOT) {
        flush();
        open.at(-1).children.push({slot: slot++});
        start = at + 1;
      }
      at += 1;
    }
    flush();
  };
  const element = () => {
    const node = {type: value(isUnquotedEnd), properties: [], children: []};
    open.at(-1).children.push(node);
    for (;;) {
      skipBlanks();
      if (at >= text.length) {
        fail('an element is not closed');
      }
      if (text[at] === '>') {
        at += 1;
        open.push(node);
        return;
      }
      if (text.startsWith('/>', at)) {
        at += 2;
        return;
      }
      if (text.startsWith('...' + SLOT, at)) {
        node.properties.push({spread: slot++});
        at += 4;
        continue;
      }
      const start = at;
      while (at < text.length && !isBlank(text[at]) && !'=>/'.includes(text[at])) {
        at += 1;
      }
      const name = text.slice(start, at);
      if (!name || name.includes(SLOT)) {
        fail('the name of a property is missing');
      }
      if (text[at] !== '=') {
        node.properties.push({name, value: true});
        continue;
      }
      at += 1;
      const quote = text[at] === '"' || text[at] === "'" ? text[at] : '';
      if (quote) {
        at += 1;
      }
      const given = value(quote ? (c) => c === quote : isUnquotedEnd);
      if (quote) {
        at += 1;
      }
      node.properties.push({name, value: given});
    }
  };
  while (at < text.length) {
    content();
    if (at >= text.length) {
      break;
    }
    if (text.startsWith('</', at) || text.startsWith('<//>', at)) {
      at += 2;
      value((c) => c === '>');
      at += 1;
      open.pop();
      if (open.length === 0) {
        fail('one end too many');
      }
    } else {
      at += 1;
      element();
    }
  }
  if (open.length !== 1) {
    fail('an element is not closed');
  }
  return root.children;
}

function build(node, slots, make) {
  if (typeof node === 'string') {
    return node;
  }
  if (node.slot !== undefined) {
    return slots[node.slot];
  }
  const properties = {};
  for (const property of node.properties) {
    if (property.spread !== undefined) {
      Object.assign(properties, slots[property.spread]);
    } else {
      properties[property.name] = filled(property.value, slots);
    }
  }
  return make(filled(node.type, slots), properties, ...node.children.map((child) => build(child, slots, make)));
}

function filled(value, slots) {
  if (typeof value !== 'object') {
    return value;
  }
  return value.slot !== undefined ? slots[value.slot] : value.joined.map((part) => filled(part, slots) ?? '').join('');
}
