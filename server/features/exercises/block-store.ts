import { LRUCache } from 'lru-cache'

/** Bytes that stand for something, kept once however many refer to them. */
export interface Block {
  readonly bytes: Buffer
}

/** Blocks lie side by side in pieces of this size: a buffer of its own for each would cost as much again. */
const PIECE = 256 * 1024

/** Blocks whose contents stay alive once they were read: all of an ordinary catalogue. */
const ALIVE = 400

/**
 * Keeps equal bytes once (twins share their geometry) and what was read from them for as long as it is looked at often:
 * a long catalogue of live objects would fill the memory.
 */
export class BlockStore<T extends object> {
  private byHash = new Map<string, Block>()
  private piece = Buffer.alloc(0)
  private used = 0
  private readonly alive = new LRUCache<Block, T>({ max: ALIVE })

  constructor(private readonly read: (bytes: Buffer) => T) {}

  /** The block whose bytes have this hash, if they are kept. */
  find(hash: string): Block | undefined {
    return this.byHash.get(hash)
  }

  /** The block of the bytes that have this hash; they are copied unless they are kept already. */
  keep(hash: string, bytes: Buffer): Block {
    const block = this.byHash.get(hash) ?? { bytes: this.copy(bytes) }
    this.byHash.set(hash, block)
    return block
  }

  private copy(bytes: Buffer): Buffer {
    if (this.used + bytes.length > this.piece.length) {
      this.piece = Buffer.allocUnsafeSlow(Math.max(PIECE, bytes.length))
      this.used = 0
    }
    const start = this.used
    this.used += bytes.copy(this.piece, start)
    return this.piece.subarray(start, this.used)
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
