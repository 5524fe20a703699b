import { runCommand } from '../run.mjs'
import { serve } from '../serve.mjs'

await runCommand((run) => serve(run, 'built'), { exitCodeOnSignal: 0 })
