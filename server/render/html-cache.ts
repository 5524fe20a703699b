import { createHash } from 'node:crypto'
import { promisify } from 'node:util'
import { brotliCompress, constants, gzip } from 'node:zlib'

const brotli = promisify(brotliCompress)
const zip = promisify(gzip)
/** Good enough to be sent at once: the next step up costs several times the time for a few per cent. */
const BROTLI_QUALITY = 5
/** What an entry costs beside its pages, roughly, in bytes. */
const ENTRY_OVERHEAD_BYTES = 500
/** How much the compressed forms add to a page, roughly. */
const COMPRESSED_SHARE = 0.4

export type Encoding = 'identity' | 'gzip' | 'br'

/** A page as it is sent: its bytes, plain and compressed, and a tag that names them. */
export class CachedPage {
  readonly #plain: Buffer
  readonly #tag: string
  readonly #compressed = new Map<Encoding, Promise<Buffer>>()

  constructor(
    readonly status: number,
    html: string,
    /** Where the reader is sent instead, else null. */
    readonly location: string | null = null,
  ) {
    this.#plain = Buffer.from(html, 'utf8')
    this.#tag = createHash('sha256').update(this.#plain).digest('base64url').slice(0, 22)
  }

  /** What the page weighs in the cache, in bytes. */
  get weight(): number {
    return Math.ceil(this.#plain.length * (1 + COMPRESSED_SHARE)) + ENTRY_OVERHEAD_BYTES
  }

  /** The entity tag of one form of the page. */
  etag(encoding: Encoding): string {
    return encoding === 'identity' ? `"${this.#tag}"` : `"${this.#tag}-${encoding}"`
  }

  /** The plain bytes, or a promise of compressed ones; each form is made once. */
  bytes(encoding: Encoding): Buffer | Promise<Buffer> {
    if (encoding === 'identity') return this.#plain
    const held = this.#compressed.get(encoding)
    if (held !== undefined) return held
    const made =
      encoding === 'gzip'
        ? zip(this.#plain)
        : brotli(this.#plain, { params: { [constants.BROTLI_PARAM_QUALITY]: BROTLI_QUALITY } })
    this.#compressed.set(encoding, made)
    return made
  }
}

/** Pages of one epoch by key, the least recently used dropped first once they weigh more than `bytesMax` together. */
export class HtmlCache {
  readonly #pages = new Map<string, CachedPage>()
  readonly #underWay = new Map<string, Promise<CachedPage>>()
  #epoch: string | null = null
  #weight = 0

  constructor(private readonly bytesMax: number) {}

  /** The page at hand for this key, if it belongs to this epoch. */
  find(epoch: string, key: string): CachedPage | null {
    if (epoch !== this.#epoch) return null
    const page = this.#pages.get(key)
    if (page === undefined) return null
    this.#pages.delete(key)
    this.#pages.set(key, page)
    return page
  }

  /**
   * Makes the page at most once at a time for all who ask for it together, and keeps it if `make` says so and no newer
   * epoch has begun meanwhile.
   */
  async make(
    epoch: string,
    key: string,
    make: () => Promise<{ page: CachedPage; keep: boolean }>,
  ): Promise<CachedPage> {
    const ticket = `${epoch} ${key}`
    const running = this.#underWay.get(ticket)
    if (running !== undefined) return running
    const made = make().then(({ page, keep }) => {
      if (keep) this.#keep(epoch, key, page)
      return page
    })
    this.#underWay.set(ticket, made)
    try {
      return await made
    } finally {
      this.#underWay.delete(ticket)
    }
  }

  #keep(epoch: string, key: string, page: CachedPage): void {
    if (epoch !== this.#epoch) {
      if (this.#epoch !== null && BigInt(epoch) < BigInt(this.#epoch)) return
      this.#pages.clear()
      this.#weight = 0
      this.#epoch = epoch
    }
    if (page.weight > this.bytesMax) return
    this.#weight += page.weight - (this.#pages.get(key)?.weight ?? 0)
    this.#pages.delete(key)
    this.#pages.set(key, page)
    for (const [oldest, { weight }] of this.#pages) {
      if (this.#weight <= this.bytesMax) break
      this.#pages.delete(oldest)
      this.#weight -= weight
    }
  }
}
