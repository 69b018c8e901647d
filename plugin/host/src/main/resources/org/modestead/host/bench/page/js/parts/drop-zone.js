/** Takes files that are dropped anywhere on the page. */
import {html, useEffect, useState} from '../../lib.js';
import {getState} from '../store.js';
import {notify, openDialog} from '../actions.js';
import {isTable} from '../tables.js';

/** @param {{take: (file: File) => any}} props what is done with a file when no workflow is open */
export function DropZone({take}) {
  const [over, setOver] = useState(false);
  useEffect(() => {
    const carries = (event) => [...(event.dataTransfer?.types ?? [])].includes('Files');
    const move = (event) => {
      if (carries(event)) {
        event.preventDefault();
        event.dataTransfer.dropEffect = getState().dialog ? 'none' : 'copy';
        setOver(!getState().dialog);
      }
    };
    const leave = (event) => {
      if (!event.relatedTarget) {
        setOver(false);
      }
    };
    const drop = (event) => {
      setOver(false);
      if (carries(event)) {
        event.preventDefault();
        if (!getState().dialog) {
          takeFile(event.dataTransfer.files[0], take);
        }
      }
    };
    window.addEventListener('dragover', move);
    window.addEventListener('dragleave', leave);
    window.addEventListener('drop', drop);
    return () => {
      window.removeEventListener('dragover', move);
      window.removeEventListener('dragleave', leave);
      window.removeEventListener('drop', drop);
    };
  }, [take]);
  return over && html`<div class="drop-zone" aria-hidden="true"><p>Drop the file anywhere: a recording (CSV, Parquet, JSON) or a workflow.json</p></div>`;
}

function takeFile(file, take) {
  if (!file) {
    return;
  }
  if (!isTable(file.name)) {
    notify(`${file.name}: not a file the bench can read; drop a table ending in .csv, .tsv, .txt, .parquet or .json.`, 'stop');
  } else if (getState().desk?.open) {
    openDialog({kind: 'dropped', file});
  } else {
    take(file);
  }
}
