import {useEffect, useState} from '../lib.js';

/** Height of the window in pixels; whoever uses it is drawn anew, and so measures anew, when the window or the letters change their size. */
export function useWindowHeight() {
  const [size, setSize] = useState([window.innerWidth, window.innerHeight]);
  useEffect(() => {
    const take = () => setSize([window.innerWidth, window.innerHeight]);
    window.addEventListener('resize', take);
    return () => window.removeEventListener('resize', take);
  }, []);
  return size[1];
}
