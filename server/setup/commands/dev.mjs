import { runCommand } from '../run.mjs'
import { serve } from '../serve.mjs'

await runCommand((run) => serve(run, 'source'), { exitCodeOnSignal: 0 })
