import type { Problem } from '../../shared/errors.js'
import { escapeHtml } from './escape.js'

/** A page that says an error, whole in itself: it must work when nothing else does. Colours are the browser's own. */
export function writeErrorPage(problem: Problem): string {
  const title = escapeHtml(problem.title)
  const reference =
    problem.status >= 500 && problem.requestId !== undefined
      ? `<p>If you report this, please give this number: <code>${escapeHtml(problem.requestId)}</code></p>`
      : ''
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="robots" content="noindex">
<title>${title} · Mossgauge</title>
<style>
:root { color-scheme: light dark; }
body { margin: 0 auto; max-width: 40rem; padding: 3rem 1rem; font: 1rem/1.6 "Fira Sans", system-ui, sans-serif; }
</style>
</head>
<body>
<main>
<h1>${title}</h1>
<p>${escapeHtml(problem.detail ?? '')}</p>
${reference}
<p><a href="/">To the start</a> · <a href="/species">Find a species</a></p>
</main>
</body>
</html>
`
}
