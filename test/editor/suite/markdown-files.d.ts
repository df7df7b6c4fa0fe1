// The bundler puts the text of a Markdown file in the place of its import.
declare module '*.md' {
  const text: string;
  export default text;
}
