import type { Letter, Mailer } from '#server/mail/mailer'

/** A mailer that keeps what it was given. */
export class MailBox implements Mailer {
  readonly letters: Letter[] = []

  send(letter: Letter): Promise<void> {
    this.letters.push(letter)
    return Promise.resolve()
  }

  close(): void {}
}
