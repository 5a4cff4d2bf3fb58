import { renderMail } from '~/mail/layout'
import { codeRules, formatDigits } from './code'

/** The mail that brings a code: nothing in it signs anybody in by being followed. */
export function toCodeMail({ code, appUrl }: { code: string; appUrl: string }) {
  const { host } = new URL(appUrl)
  return {
    subject: 'Your code to sign in to Cragfettle',
    ...renderMail({
      heading: 'Your code to sign in',
      figure: formatDigits(code),
      paragraphs: [
        `Type it on ${host}, in the browser in which you asked for it. It works once, for ${codeRules.minutes} minutes from when you asked.`,
        'Nobody of ours will ever ask you for a code. Give it to no one.',
      ],
      footer: [
        'You did not ask for a code? Then somebody typed your address. Do nothing: without the code nobody gets in.',
      ],
    }),
  }
}
