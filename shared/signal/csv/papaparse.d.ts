/**
 * The part of PapaParse used here. Its own types pull in Node's and the browser's globals, which
 * `shared` is compiled without on purpose; so the file is imported by its path, under this name.
 */
declare module 'papaparse/papaparse.min.js' {
  interface ParseResult {
    data: string[][];
    meta: { delimiter: string };
  }
  const papa: {
    parse(
      text: string,
      config: { delimiter?: string; delimitersToGuess?: readonly string[]; preview?: number },
    ): ParseResult;
  };
  export { papa as default };
}
