/** A film that can't be prepared. The message is a sentence for the mentor; `log` is what the program said, for the log. */
export class MediaFault extends Error {
  readonly log: string;

  constructor(message: string, log = "") {
    super(message);
    this.name = "MediaFault";
    this.log = log;
  }
}
