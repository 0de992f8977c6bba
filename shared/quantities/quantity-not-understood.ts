/** A typed quantity that says nothing to the program. Its message is a sentence for the person who typed it. */
export class QuantityNotUnderstood extends RangeError {
  override readonly name: string = 'QuantityNotUnderstood';

  constructor(
    /** What was typed. */
    readonly text: string,
    /** What is the matter and what to type instead. */
    readonly hint: string,
  ) {
    super(text.trim() === '' ? hint : `“${text.trim()}”: ${hint}`);
  }
}

/** A typed quantity that can be read in two ways; it is asked back, never guessed. */
export class AmbiguousQuantity extends QuantityNotUnderstood {
  override readonly name = 'AmbiguousQuantity';
}
