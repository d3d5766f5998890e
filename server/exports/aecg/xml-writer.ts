import { createCB } from 'xmlbuilder2';
import { allowedInXml } from '../../../shared/formats/svg';

export type Attributes = Readonly<Record<string, string>>;

/** Writes elements one after another, so that no tree of a long strip is ever held. */
export interface XmlWriter {
  /** An element; `content` writes what lies in it, or is its text. */
  element(name: string, attributes?: Attributes, content?: (() => void) | string): void;
}

/** The pieces of an XML document, in order. */
export function writeXml(
  root: { namespace: string; name: string; attributes: Attributes },
  content: (xml: XmlWriter) => void,
): string[] {
  const pieces: string[] = [];
  const builder = createCB({ prettyPrint: true, data: (piece: string) => pieces.push(piece) });
  const xml: XmlWriter = {
    element(name, attributes = {}, inside) {
      builder.ele(name, attributes);
      if (typeof inside === 'string') builder.txt(allowedInXml(inside));
      else inside?.();
      builder.up();
    },
  };
  builder.dec({ version: '1.0', encoding: 'UTF-8' });
  builder.ele(root.namespace, root.name, root.attributes);
  content(xml);
  builder.up();
  builder.end();
  return pieces;
}
