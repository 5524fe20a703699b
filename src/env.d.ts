/** Lets tools that do not read single-file components give an imported one a type; vue-tsc reads the file itself. */
declare module '*.vue' {
  import type { DefineComponent } from 'vue'
  const component: DefineComponent
  export default component
}
