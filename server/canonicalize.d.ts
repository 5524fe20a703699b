// The package's own types describe an ES module, while the file is CommonJS and exports the function itself.
declare module 'canonicalize' {
  function canonicalize(input: unknown): string | undefined
  export = canonicalize
}
