/** How the page looks, and help. */
import {html, useState} from '../../lib.js';
import {openDialog, say} from '../actions.js';
import {Menu} from './menu.js';

export function ViewMenu() {
  const [choice, setChoice] = useState(window.modesteadPage.theme());
  const theme = (name, label) => ({
    label,
    checked: choice === name,
    action: `theme-${name}`,
    act: () => {
      window.modesteadPage.chooseTheme(name);
      setChoice(name);
      say(`${label}.`);
    },
  });
  return html`<${Menu} label="View" action="view-menu" items=${[
    theme('light', 'Light'),
    theme('dark', 'Dark'),
    theme('system', 'As the system'),
    null,
    {label: 'Keys…', action: 'keys', keys: 'F1', act: () => openDialog({kind: 'keys'})},
  ]} />`;
}
