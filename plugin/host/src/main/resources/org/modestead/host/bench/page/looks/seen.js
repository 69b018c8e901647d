import {useEffect, useState} from '../lib.js';

/** Whether an element has come near the window's visible part; once true, always true. */
export function useSeen(ref) {
  const [seen, setSeen] = useState(false);
  useEffect(() => {
    if (seen || !ref.current) {
      return undefined;
    }
    const watch = new IntersectionObserver((entries) => entries.some((entry) => entry.isIntersecting) && setSeen(true),
      {rootMargin: '300px'});
    watch.observe(ref.current);
    return () => watch.disconnect();
  }, [seen]);
  return seen;
}
