import { useEffect, useState } from 'react';
import { createPortal, flushSync } from 'react-dom';
import { drawingToSvg } from '../../../../shared/formats/svg';
import type { SheetPage } from '../../../../shared/paper/pages/sheet-document';
import { styleNonce } from '../../../lib/style-nonce';

/**
 * What the browser prints instead of the page on the screen: every sheet as vectors on paper of its size, without
 * margins, so that 1 mm is 1 mm. Made when printing begins, from the menu of the browser as well as from ours.
 */
export function PrintPages({ pages }: { pages: readonly SheetPage[] }) {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    // The browser takes the page as it stands when the event returns.
    const begin = (): void => flushSync(() => setPrinting(true));
    const end = (): void => setPrinting(false);
    window.addEventListener('beforeprint', begin);
    window.addEventListener('afterprint', end);
    return () => {
      window.removeEventListener('beforeprint', begin);
      window.removeEventListener('afterprint', end);
    };
  }, []);
  if (!printing || pages.length === 0) return null;
  const [{ widthMm, heightMm }] = pages;
  return createPortal(
    <div className="print-pages">
      <style nonce={styleNonce()}>{`@page { size: ${widthMm}mm ${heightMm}mm; margin: 0 }`}</style>
      {pages.map((page, i) => (
        <div key={i} dangerouslySetInnerHTML={{ __html: drawingToSvg(page) }} />
      ))}
    </div>,
    document.body,
  );
}
