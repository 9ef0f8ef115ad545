import { once } from 'node:events';

/** Text is written in pieces of about this many characters. */
const PIECE = 1 << 16;

/** Standard output in pieces, waiting while the reader is slower. */
export class Output {
  private piece = '';

  get isFull(): boolean {
    return this.piece.length >= PIECE;
  }

  add(text: string): void {
    this.piece += text;
  }

  async flush(): Promise<void> {
    const { piece } = this;
    this.piece = '';
    if (!process.stdout.write(piece)) await once(process.stdout, 'drain');
  }
}
