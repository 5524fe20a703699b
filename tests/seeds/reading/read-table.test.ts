import { afterAll, describe, expect, it } from 'vitest'
import { readTable } from '../../../seeds/reading/read-table.js'
import { InvalidInput } from '../../../server/errors.js'
import { makeFolder } from '../../helpers/dataset-files.js'

const folder = makeFolder()
afterAll(folder.remove)

const header = ['name', 'value', 'note']
let files = 0
const read = (content: string | Uint8Array) => {
  files += 1
  return readTable(folder.write(`${files}.csv`, content), header)
}

describe('reading a table', () => {
  it('gives each row with its line, also behind a value that holds line breaks', async () => {
    const { rows } = await read('name,value,note\na,1,"one\ntwo"\nb,2,"say ""hello"", twice"\n')
    expect(rows).toEqual([
      { line: 2, cells: { name: 'a', value: '1', note: 'one\ntwo' } },
      { line: 4, cells: { name: 'b', value: '2', note: 'say "hello", twice' } },
    ])
  })

  it('reads lines that end in carriage return and line feed, and a byte order mark', async () => {
    const { rows } = await read('\uFEFFname,value,note\r\na,1,x\r\n')
    expect(rows).toEqual([{ line: 2, cells: { name: 'a', value: '1', note: 'x' } }])
  })

  it('keeps a letter that two pieces of the stream share', async () => {
    const filler = 'x'.repeat(65_518)
    const { rows } = await read(`name,value,note\n${filler},ž,ý\n`)
    expect(rows[0]?.cells).toEqual({ name: filler, value: 'ž', note: 'ý' })
  })

  it('knows a file by the hash of its bytes', async () => {
    const { sha256 } = await readTable(folder.write('hash.csv', 'abc\nabc\n'), ['abc'])
    // printf 'abc\nabc\n' | sha256sum (GNU coreutils)
    expect(sha256.toString('hex')).toBe('efbaea14f77d3395edd863ea7f247511362a2574db213338ae5c3a6027ff1341')
  })

  it.each([
    ['another column', 'name,worth,note\na,1,x\n', 'The file has other columns: “value” is missing.'],
    [
      'a column too many',
      'name,value,note,more\na,1,x,y\n',
      'The file has a column it should not have: “more”.',
    ],
    [
      'another order',
      'value,name,note\n1,a,x\n',
      'The columns of the file stand in another order than expected.',
    ],
    ['a short row', 'name,value,note\na,1\n', 'Line 2 has 2 columns instead of 3.'],
    ['a long row', 'name,value,note\na,1,x,y\n', 'Line 2 has 4 columns instead of 3.'],
    ['an empty line in the middle', 'name,value,note\na,1,x\n\nb,2,y\n', 'Line 3 is empty.'],
    [
      'an end inside quotation marks',
      'name,value,note\na,1,"x\nb,2,y\n',
      'The file ends inside the quotation marks opened on line 2, so it is cut off.',
    ],
    [
      'a quotation mark inside a value',
      'name,value,note\na,1,"x"y\n',
      'Line 2 has a quotation mark in the wrong place.',
    ],
    [
      'an end inside a line',
      'name,value,note\na,1,x\nb,2,y',
      'The file does not end with a whole line, so it is cut off.',
    ],
    ['no rows', 'name,value,note\n', 'The file has a header and no rows.'],
    ['nothing', '', 'The file is empty.'],
    ['a zero byte', 'name,value,note\na,1,\0\n', 'The file holds a zero byte, so it is no text.'],
  ])('refuses a file with %s in one sentence', async (_, content, sentence) => {
    await expect(read(content)).rejects.toThrow(new InvalidInput(sentence))
  })

  it('refuses a file in another encoding', async () => {
    const latin1 = Buffer.from('name,value,note\nBalogov\u00e1,1,x\n', 'latin1')
    await expect(read(latin1)).rejects.toThrow('The file is not UTF-8 text')
  })

  it('refuses a file that is cut off inside a letter', async () => {
    const whole = Buffer.from('name,value,note\na,1,é')
    await expect(read(whole.subarray(0, -1))).rejects.toThrow('The file is not UTF-8 text')
  })

  it('refuses a file that is not there', async () => {
    await expect(readTable('nowhere.csv', header)).rejects.toThrow('The file nowhere.csv cannot be read.')
  })
})
