/** A setting that cannot be used. The message is one sentence for the person who started the program. */
export class SettingsFailure extends Error {
  readonly kind = 'settings';

  constructor(sentence: string) {
    super(sentence);
    this.name = 'SettingsFailure';
  }
}
