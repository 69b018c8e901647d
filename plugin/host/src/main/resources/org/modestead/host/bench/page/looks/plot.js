import {html, useEffect, useLayoutEffect, useMemo, useRef, useState} from '../lib.js';
import {charts} from './charts.js';
import {mapping, nearest, reading, targets} from './places.js';
import {optionOf} from './option.js';

/**
 * The drawn part of a picture. It is one stop of the Tab key: arrows go from mark to mark, Enter selects, + and - zoom, 0 goes back.
 *
 * @param {object} given
 * @param {any} given.figure
 * @param {any} given.theme
 * @param {string} given.selection
 * @param {(key: string) => void} given.select
 * @param {Set<string>} given.hidden names that are not drawn
 * @param {string} given.label for readers of screens
 * @param {string} given.describedBy id of the caption
 * @param {(text: string) => void} given.say what is under the pointer or the keyboard's mark
 * @param {{current: any}} given.handle gets {zoom(factor), reset()}
 */
export function Plot({figure, theme, selection, select, hidden, label, describedBy, say, handle, option = optionOf, points = targets}) {
  const place = useRef(null);
  const chart = useRef(null);
  const pointer = useRef(null);
  const cursor = useRef({series: 0, item: -1});
  const [width, setWidth] = useState(0);
  const [fault, setFault] = useState('');
  const latest = useRef({});
  /* Every move of the pointer tells something and so draws this anew: the things of a large picture are gathered once. */
  const all = useMemo(() => points(figure, hidden), [figure, hidden]);
  latest.current = {figure, selection, select, say, series: all};

  useEffect(() => {
    let gone = false;
    let watch = null;
    charts().then((library) => {
      if (gone) {
        return;
      }
      chart.current = library.init(place.current, null, {renderer: 'canvas'});
      pointer.current = new library.graphic.Circle({
        shape: {r: 9}, silent: true, invisible: true, z: 100, style: {fill: 'transparent', lineWidth: 2},
      });
      chart.current.getZr().add(pointer.current);
      listen(chart.current, pointer.current, latest);
      watch = new ResizeObserver(() => {
        chart.current?.resize();
        setWidth(Math.round(place.current?.clientWidth ?? 0));
      });
      watch.observe(place.current);
      setWidth(Math.round(place.current.clientWidth));
    }, () => setFault('The library that draws pictures could not be loaded. The numbers are in the table below.'));
    return () => {
      gone = true;
      watch?.disconnect();
      chart.current?.dispose();
      chart.current = null;
    };
  }, []);

  useLayoutEffect(() => {
    if (!chart.current || width === 0) {
      return;
    }
    const zooms = currentZoom(chart.current);
    chart.current.setOption(option(figure, theme, selection, {hidden, width}), {notMerge: true});
    zooms.forEach((zoom) => chart.current.dispatchAction({type: 'dataZoom', dataZoomId: zoom.id, start: zoom.start, end: zoom.end}));
    pointer.current.setStyle('stroke', theme.accent);
    place.current.dataset.drawn = 'true';
  }, [figure, theme, selection, hidden, width]);

  handle.current = {
    zoom: (factor) => change(() => zoomed(chart.current, factor, middle())),
    reset: () => change(() => currentZoom(chart.current).forEach((zoom) => chart.current.dispatchAction(
      {type: 'dataZoom', dataZoomId: zoom.id, start: 0, end: 100}))),
    move: (across, upwards) => change(() => moved(chart.current, across, upwards)),
  };

  const marked = () => latest.current.series[cursor.current.series]?.items[cursor.current.item];
  /** The keyboard's mark stays where its value is. */
  const change = (act) => {
    if (chart.current) {
      act();
      const item = marked();
      if (item && !pointer.current.invisible) {
        const map = mapping(chart.current, figure);
        pointer.current.attr({x: map.x(item.x), y: map.y(item.y)});
      }
    }
  };
  /** Where the keyboard's mark is on the screen, so that zooming goes there; null for the middle. */
  const middle = () => {
    const item = marked();
    if (!item || pointer.current.invisible) {
      return null;
    }
    const map = mapping(chart.current, figure);
    return [map.x(item.x), map.y(item.y)];
  };

  const onKeyDown = (event) => {
    if (event.ctrlKey || event.metaKey || event.altKey) {
      return;
    }
    const {series} = latest.current;
    const act = () => {
      if (event.shiftKey && event.key.startsWith('Arrow')) {
        handle.current.move((event.key === 'ArrowRight') - (event.key === 'ArrowLeft'), (event.key === 'ArrowUp') - (event.key === 'ArrowDown'));
        return true;
      }
      switch (event.key) {
        case '+':
        case '=':
          handle.current.zoom(0.7);
          return true;
        case '-':
          handle.current.zoom(1 / 0.7);
          return true;
        case '0':
          handle.current.reset();
          return true;
        case 'ArrowRight':
          return step(1);
        case 'ArrowLeft':
          return step(-1);
        case 'ArrowDown':
          return another(1);
        case 'ArrowUp':
          return another(-1);
        case 'Enter':
        case ' ': {
          const item = marked();
          if (item?.key) {
            select(item.key === selection ? '' : item.key);
          }
          return true;
        }
        default:
          return false;
      }
    };
    const step = (by) => {
      let {series: s, item} = cursor.current;
      item += by;
      if (item < 0 || item >= (series[s]?.items.length ?? 0)) {
        s = (s + by + series.length) % series.length;
        item = by > 0 ? 0 : (series[s]?.items.length ?? 1) - 1;
      }
      return show(s, item);
    };
    const another = (by) => show((cursor.current.series + by + series.length) % series.length, Math.max(0, cursor.current.item));
    const show = (s, item) => {
      if (series.length === 0 || !chart.current) {
        return true;
      }
      const items = series[s].items;
      cursor.current = {series: s, item: Math.min(items.length - 1, item)};
      const found = items[cursor.current.item];
      const map = mapping(chart.current, figure);
      pointer.current.attr({x: map.x(found.x), y: map.y(found.y), invisible: false});
      say(reading(figure, series[s], found));
      return true;
    };
    if (act()) {
      event.preventDefault();
      event.stopPropagation();
    }
  };

  return html`<div class="lk-plot" role="application" aria-roledescription="picture" aria-label=${label} aria-describedby=${describedBy}
      tabindex="0" onKeyDown=${onKeyDown} onBlur=${() => pointer.current?.attr({invisible: true})}>
    <div class="lk-canvas" ref=${place} aria-hidden="true"></div>
    ${fault && html`<p class="lk-fault">${fault}</p>`}
  </div>`;
}

/** Pointing tells, clicking selects. */
function listen(chart, pointer, latest) {
  const zr = chart.getZr();
  /** What is under the pointer and where it lies; null for nothing. */
  const find = (event) => {
    if (!chart.containPixel({gridIndex: 0}, [event.offsetX, event.offsetY])) {
      return null;
    }
    const map = mapping(chart, latest.current.figure);
    const hit = nearest(latest.current.series, map, event.offsetX, event.offsetY);
    return hit && {...hit, x: map.x(hit.item.x), y: map.y(hit.item.y)};
  };
  zr.on('mousemove', (event) => {
    const hit = find(event);
    if (!hit) {
      pointer.attr({invisible: true});
      zr.setCursorStyle('default');
      return;
    }
    pointer.attr({x: hit.x, y: hit.y, invisible: false});
    zr.setCursorStyle(hit.item.key ? 'pointer' : 'crosshair');
    latest.current.say(reading(latest.current.figure, hit.series, hit.item));
  });
  zr.on('globalout', () => pointer.attr({invisible: true}));
  zr.on('click', (event) => {
    const hit = find(event);
    if (hit?.item.key) {
      latest.current.select(hit.item.key === latest.current.selection ? '' : hit.item.key);
    }
  });
}

function currentZoom(chart) {
  return (chart.getOption()?.dataZoom ?? []).map(({id, start, end}) => ({id, start: start ?? 0, end: end ?? 100}));
}

/** Zooms so that a place of the screen stays where it is; without one, the middle. */
function zoomed(chart, factor, place) {
  const {x, y, width, height} = chart.getModel().getComponent('grid', 0).coordinateSystem.getRect();
  for (const {id, start, end} of currentZoom(chart)) {
    const share = !place ? 0.5 : id === 'across' ? (place[0] - x) / width : 1 - (place[1] - y) / height;
    const at = start + Math.min(1, Math.max(0, share)) * (end - start);
    const span = Math.min(100, Math.max(0.1, (end - start) * factor));
    const from = Math.min(Math.max(0, at - share * span), 100 - span);
    chart.dispatchAction({type: 'dataZoom', dataZoomId: id, start: from, end: from + span});
  }
}

function moved(chart, across, upwards) {
  for (const {id, start, end} of currentZoom(chart)) {
    const by = (id === 'across' ? across : upwards) * (end - start) * 0.15;
    const from = Math.min(Math.max(0, start + by), 100 - (end - start));
    chart.dispatchAction({type: 'dataZoom', dataZoomId: id, start: from, end: from + end - start});
  }
}
