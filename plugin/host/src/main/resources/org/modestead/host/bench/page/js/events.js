/** Listens to what the server tells by itself: changes of the desk, progress of runs, its end. */
import {takeDesk, takeProgress, notify} from './actions.js';
import {getState, setState} from './store.js';

const PAUSE = 2000;

/** Listens for as long as the page is open; a stream that broke is taken up again. */
export function listen() {
  const source = new EventSource('/api/events');
  source.addEventListener('open', () => {
    if (getState().lost) {
      setState({lost: false});
      notify('The bench answers again.');
    }
  });
  source.addEventListener('error', () => {
    setState({lost: true});
    if (source.readyState === EventSource.CLOSED) {
      setTimeout(listen, PAUSE);
    }
  });
  source.addEventListener('desk', (event) => takeDesk(JSON.parse(event.data)));
  source.addEventListener('progress', (event) => takeProgress(JSON.parse(event.data)));
  source.addEventListener('bye', (event) => {
    source.close();
    setState({lost: true});
    notify(JSON.parse(event.data).sentence, 'stop');
  });
}
