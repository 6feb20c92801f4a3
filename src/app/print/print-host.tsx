import { useEffect, useState } from 'react';
import { flushSync } from 'react-dom';
import { ErrorRegion } from '#src/components/error-region.tsx';
import { PrintSheet } from './print-sheet.tsx';

/** Puts the printed sheet on the page only while it is printed, whoever asked for it (menu, keys, the browser's own command). */
export function PrintHost() {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    const paper = window.matchMedia('print');
    const begin = () => flushSync(() => setPrinting(true));
    const end = () => setPrinting(paper.matches);
    const follow = () => setPrinting(paper.matches);
    window.addEventListener('beforeprint', begin);
    window.addEventListener('afterprint', end);
    paper.addEventListener('change', follow);
    return () => {
      window.removeEventListener('beforeprint', begin);
      window.removeEventListener('afterprint', end);
      paper.removeEventListener('change', follow);
    };
  }, []);
  if (!printing) return null;
  return (
    <ErrorRegion name="The printed sheet">
      <PrintSheet />
    </ErrorRegion>
  );
}
