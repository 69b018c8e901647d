/** Goes up and down a list of buttons below a search field; above the first one is the field. */

/** @param {HTMLElement} list @param {number} by 1 or -1 @param {string} field id of the search field */
export function walkList(list, by, field) {
  const items = [...list.querySelectorAll('button')];
  const next = items.indexOf(document.activeElement) + by;
  if (next < 0) {
    document.getElementById(field).focus();
  } else {
    items[next]?.focus();
  }
}
