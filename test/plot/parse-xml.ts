/** A strict parser for small XML documents, enough to tell whether a file is well-formed and what is in it. */

export interface XmlElement {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: readonly XmlElement[];
  /** All text inside, entities resolved. */
  readonly text: string;
}

const ENTITIES: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', '#39': "'" };
const TAG = /<(\/?)([A-Za-z][\w.-]*)((?:\s+[A-Za-z_][\w:.-]*="[^"<]*")*)\s*(\/?)>/y;
const NOT_ALLOWED = /[^\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]/u;

/** Throws where the text is not well-formed, or has two attributes of one name, or two elements of one id. */
export function parseXml(text: string): XmlElement {
  if (NOT_ALLOWED.test(text)) throw new Error('a character that XML does not allow');
  const top: Open = { name: '', attributes: {}, children: [], text: '' };
  const open: Open[] = [top];
  const ids = new Set<string>();
  let at = 0;
  while (at < text.length) {
    const here = open.at(-1) as Open;
    if (text[at] !== '<') {
      const end = text.indexOf('<', at) < 0 ? text.length : text.indexOf('<', at);
      const piece = resolve(text.slice(at, end));
      if (open.length === 1 && piece.trim() !== '') throw new Error('text outside the root element');
      for (const element of open) element.text += piece;
      at = end;
      continue;
    }
    TAG.lastIndex = at;
    const tag = TAG.exec(text);
    if (!tag) throw new Error(`no tag at ${JSON.stringify(text.slice(at, at + 60))}`);
    const [whole, slash, name = '', attributes = '', selfClosed] = tag;
    at += whole.length;
    if (slash) {
      if (here.name !== name || open.length === 1) throw new Error(`</${name}> closes <${here.name}>`);
      open.pop();
      continue;
    }
    const element: Open = { name, attributes: attributesOf(attributes), children: [], text: '' };
    const { id } = element.attributes;
    if (id !== undefined && ids.has(id)) throw new Error(`the id ${id} is there twice`);
    if (id !== undefined) ids.add(id);
    here.children.push(element);
    if (!selfClosed) open.push(element);
  }
  const [root] = top.children;
  if (open.length !== 1 || !root || top.children.length !== 1) throw new Error('not one closed root element');
  return root;
}

/** Every element of a name, in the order of the document, optionally of one class. */
export function elementsOf(root: XmlElement, name: string, className?: string): XmlElement[] {
  const found = root.children.flatMap((child) => elementsOf(child, name, className));
  const isOne = root.name === name && (className === undefined || root.attributes['class'] === className);
  return isOne ? [root, ...found] : found;
}

interface Open {
  name: string;
  attributes: Record<string, string>;
  children: XmlElement[];
  text: string;
}

function attributesOf(text: string): Record<string, string> {
  const attributes: Record<string, string> = {};
  for (const [, name = '', value = ''] of text.matchAll(/([A-Za-z_][\w:.-]*)="([^"]*)"/g)) {
    if (Object.hasOwn(attributes, name)) throw new Error(`the attribute ${name} is there twice`);
    attributes[name] = resolve(value);
  }
  return attributes;
}

function resolve(text: string): string {
  return text.replace(/&([^;&\s]*);?/g, (whole, name: string) => {
    const character = whole.endsWith(';') ? ENTITIES[name] : undefined;
    if (character === undefined) throw new Error(`${whole} is no entity`);
    return character;
  });
}
