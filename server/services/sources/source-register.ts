import type { SourceMerge } from './merge-sources.js'

/** The keys under which a citation is recognised, each null where it has none. */
export interface SourceKeys {
  doi: string | null
  reference: string | null
}

interface RegisteredSource {
  id: string
  doi: string | null
  hasReference: boolean
}

/**
 * Decides, source by source, which citations are one and the same study. Holds the known sources that any of the citations
 * could be; knows nothing of the database.
 */
export class SourceRegister {
  private readonly byDoi = new Map<string, RegisteredSource>()
  private readonly byReference = new Map<string, RegisteredSource>()
  private readonly byId = new Map<string, RegisteredSource>()
  private readonly completed = new Map<string, SourceKeys>()
  private readonly heirs = new Map<string, string>()

  /** Registers a known source under a key it is found by; called again for each further key. */
  add(source: RegisteredSource, keyDoi: string | null, keyReference: string | null): void {
    const known = this.byId.get(source.id) ?? source
    this.byId.set(known.id, known)
    if (keyDoi !== null) this.byDoi.set(keyDoi, known)
    if (keyReference !== null) this.byReference.set(keyReference, known)
  }

  /** Finds the source that a citation's keys name, or registers a new one. */
  place(keys: SourceKeys, mintId: () => string): { id: string; isNew: boolean } {
    const ofDoi = this.find(this.byDoi, keys.doi)
    const ofReference = this.find(this.byReference, keys.reference)
    if (ofDoi !== undefined) {
      // Another DOI says that it is another work, however alike the words.
      if (ofReference !== undefined && ofReference !== ofDoi && ofReference.doi === null) {
        this.heirs.set(ofReference.id, ofDoi.id)
      }
      if (ofReference === undefined) this.complete(ofDoi, { doi: null, reference: keys.reference })
      return { id: ofDoi.id, isNew: false }
    }
    if (ofReference !== undefined && (keys.doi === null || ofReference.doi === null)) {
      this.complete(ofReference, { doi: keys.doi, reference: null })
      return { id: ofReference.id, isNew: false }
    }
    const source = { id: mintId(), doi: null, hasReference: false }
    this.byId.set(source.id, source)
    this.complete(source, { doi: keys.doi, reference: ofReference === undefined ? keys.reference : null })
    return { id: source.id, isNew: true }
  }

  /** The keys that sources, new ones among them, have taken on. */
  completedKeys(): ({ id: string } & SourceKeys)[] {
    return [...this.completed].map(([id, keys]) => ({ id, ...keys }))
  }

  /** The sources that turned out to be one study with another. */
  merges(): SourceMerge[] {
    return [...this.heirs.keys()].map((fromId) => ({ fromId, intoId: this.heirOf(fromId) }))
  }

  heirOf(id: string): string {
    const heir = this.heirs.get(id)
    return heir === undefined ? id : this.heirOf(heir)
  }

  private find(sources: Map<string, RegisteredSource>, key: string | null): RegisteredSource | undefined {
    const source = key === null ? undefined : sources.get(key)
    return source && this.byId.get(this.heirOf(source.id))
  }

  private complete(source: RegisteredSource, keys: SourceKeys): void {
    const doi = source.doi === null ? keys.doi : null
    const reference = source.hasReference ? null : keys.reference
    if (doi === null && reference === null) return
    const earlier = this.completed.get(source.id)
    this.completed.set(source.id, { doi: earlier?.doi ?? doi, reference: earlier?.reference ?? reference })
    if (doi !== null) {
      source.doi = doi
      this.byDoi.set(doi, source)
    }
    if (reference !== null) {
      source.hasReference = true
      this.byReference.set(reference, source)
    }
  }
}
