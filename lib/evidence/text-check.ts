const CONTROL_CHARACTERS = /[\u0000-\u0008\u000b\u000e-\u001f\u007f]/;

/** Reads a stream bit by bit as UTF-8 text without control characters; once it is none, it stays none. */
export class TextCheck {
  private readonly decoder = new TextDecoder("utf-8", { fatal: true });
  private holds = true;

  add(bytes: Uint8Array): void {
    if (this.holds) this.holds = this.reads(bytes);
  }

  /** Whether all of it was text; a character cut off at the end makes it none. */
  isText(): boolean {
    return this.holds && this.reads();
  }

  private reads(bytes?: Uint8Array): boolean {
    try {
      const text = bytes ? this.decoder.decode(bytes, { stream: true }) : this.decoder.decode();
      return !CONTROL_CHARACTERS.test(text);
    } catch {
      return false;
    }
  }
}
