import { createHash } from 'node:crypto'
import { LRUCache } from 'lru-cache'

/** Bytes that stand for something, kept once however many refer to them. */
export interface Block {
  readonly bytes: Buffer
}

/** Blocks whose contents stay alive once they were read: all of an ordinary catalogue. */
const ALIVE = 400

/**
 * Keeps equal bytes once (twins share their geometry) and what was read from them for as long as it is looked at often:
 * a long catalogue of live objects would fill the memory.
 */
export class BlockStore<T extends object> {
  private byHash = new Map<string, Block>()
  private readonly alive = new LRUCache<Block, T>({ max: ALIVE })

  constructor(private readonly read: (bytes: Buffer) => T) {}

  /** The block of these bytes. They are copied, so the caller may write over them. */
  keep(bytes: Buffer): Block {
    const hash = createHash('sha256').update(bytes).digest('base64')
    const known = this.byHash.get(hash)
    if (known !== undefined) return known
    const block = { bytes: Buffer.from(bytes) }
    this.byHash.set(hash, block)
    return block
  }

  /** What the block stands for. Shared: nobody may change it. */
  open(block: Block): T {
    const known = this.alive.get(block)
    if (known !== undefined) return known
    const content = this.read(block.bytes)
    this.alive.set(block, content)
    return content
  }

  /** Forgets every block that is not among these. */
  retain(blocks: ReadonlySet<Block>): void {
    this.byHash = new Map([...this.byHash].filter(([, block]) => blocks.has(block)))
  }
}
