/** The chart library, read when the first picture is looked at and never before. */
let library = null;

/** @returns {Promise<any>} the library's module */
export function charts() {
  if (library === null) {
    library = import('/lib/echarts.esm.min.js');
    library.catch(() => {
      library = null;
    });
  }
  return library;
}
