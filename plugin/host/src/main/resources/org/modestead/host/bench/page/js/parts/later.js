/** A component that is fetched when it is first wanted, so that the page is painted before. */
import {html, useEffect, useState} from '../../lib.js';

/**
 * @param {{load: () => Promise<any>, meanwhile?: any}} props how to get the component, and what stands in its place until it is there;
 * all other properties are its own
 */
export function Later({load, meanwhile = null, ...properties}) {
  const [got, setGot] = useState({});
  useEffect(() => {
    let wanted = true;
    load().then((component) => wanted && setGot({component}), (fault) => wanted && setGot({fault}));
    return () => {
      wanted = false;
    };
  }, [load]);
  if (got.fault) {
    return html`<p class="callout stop">This part of the page could not be loaded: ${got.fault.message}</p>`;
  }
  return got.component ? html`<${got.component} ...${properties} />` : meanwhile;
}
