/** The little of Papa Parse that the tests use; the package brings no types of its own. */
declare module 'papaparse' {
  const Papa: {
    parse<Row>(
      text: string,
      options?: { readonly header?: boolean },
    ): { readonly data: Row[]; readonly errors: unknown[] };
  };
  export default Papa;
}
