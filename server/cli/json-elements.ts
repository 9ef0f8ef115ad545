const QUOTE = 34;
const COMMA = 44;
const BACKSLASH = 92;
const OPEN_BRACKET = 91;
const CLOSE_BRACKET = 93;
const OPEN_BRACE = 123;
const CLOSE_BRACE = 125;

/**
 * Splits JSON text into the elements of its top-level array, or into the values of NDJSON, while it
 * arrives: only one element is held at a time. The elements themselves are not parsed here.
 */
export class JsonElements {
  /** Whether the text is one array; known after its first character. */
  isArray = false;
  private state: 'start' | 'value' | 'between' | 'after' = 'start';
  private pending = '';
  private depth = 0;
  private inString = false;
  private isEscaped = false;
  private count = 0;

  /**
   * Takes the next piece of text and returns the elements that it completes.
   *
   * @throws SyntaxError when the text around the elements is not JSON.
   */
  push(text: string): string[] {
    const elements: string[] = [];
    let from = 0;
    for (let i = 0; i < text.length; i++) {
      const code = text.charCodeAt(i);
      if (this.inString) this.readInString(code);
      else if (this.state === 'value' && this.readInValue(code)) {
        // The bracket that closes an object belongs to it, a comma or the end of the array does not.
        const isSeparator = code !== CLOSE_BRACE && code !== CLOSE_BRACKET;
        const end = this.isArray || isSeparator ? i : i + 1;
        elements.push(this.pending + text.slice(from, end));
        this.pending = '';
        this.count++;
        this.state = this.isArray && code === CLOSE_BRACKET ? 'after' : 'between';
        from = i + 1;
      } else if (this.state !== 'value' && code > 32) {
        from = this.begin(code, i);
      }
    }
    if (this.state === 'value') this.pending += text.slice(from);
    return elements;
  }

  /**
   * Says that the text is complete and returns the last element, if it is still open.
   *
   * @throws SyntaxError when the text ends too early.
   */
  end(): string[] {
    if (this.state === 'start') throw new SyntaxError('the input is empty');
    if (this.isArray && this.state !== 'after') throw new SyntaxError('the array does not end');
    return this.state === 'value' ? [this.pending] : [];
  }

  private readInString(code: number): void {
    if (this.isEscaped) this.isEscaped = false;
    else if (code === BACKSLASH) this.isEscaped = true;
    else if (code === QUOTE) this.inString = false;
  }

  /** Whether this character ends the value. */
  private readInValue(code: number): boolean {
    switch (code) {
      case QUOTE:
        this.inString = true;
        return false;
      case OPEN_BRACE:
      case OPEN_BRACKET:
        this.depth++;
        return false;
      case CLOSE_BRACE:
      case CLOSE_BRACKET:
        if (this.depth === 0) return this.isArray;
        this.depth--;
        return !this.isArray && this.depth === 0;
      case COMMA:
        return this.isArray && this.depth === 0;
      default:
        return !this.isArray && this.depth === 0 && code <= 32;
    }
  }

  /** Reads the first character of what comes next and returns where that begins. */
  private begin(code: number, at: number): number {
    if (this.state === 'after') throw new SyntaxError('text follows the array');
    if (this.state === 'start' && code === OPEN_BRACKET) {
      this.isArray = true;
      this.state = 'between';
      return at + 1;
    }
    if (this.isArray && code === CLOSE_BRACKET && this.count === 0) {
      this.state = 'after';
      return at + 1;
    }
    this.state = 'value';
    this.inString = code === QUOTE;
    if (code === OPEN_BRACE || code === OPEN_BRACKET) this.depth = 1;
    return at;
  }
}
