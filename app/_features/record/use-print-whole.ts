import { useEffect, useState } from 'react';
import { flushSync } from 'react-dom';

/** True while the page is being printed: paper has no next page to turn to, so everything is drawn. */
export function usePrintWhole(): boolean {
  const [isPrinting, setIsPrinting] = useState(false);
  useEffect(() => {
    const begin = () => flushSync(() => setIsPrinting(true));
    const end = () => setIsPrinting(false);
    window.addEventListener('beforeprint', begin);
    window.addEventListener('afterprint', end);
    return () => {
      window.removeEventListener('beforeprint', begin);
      window.removeEventListener('afterprint', end);
    };
  }, []);
  return isPrinting;
}
