import { diagnosisExample } from './examples';
import { ok, route, type Route } from '@/server/http/route';
import { diagnoseRuns } from '@/server/services/diagnoses';
import { diagnosisAnswer, diagnosisRequest } from '@/shared/api/diagnoses';
import { limits } from '@/shared/limits';

const details = `
The answer is the one that the workspace shows, made by the same engine from the same evidence. Nothing is stored.

- \`layout\` is the address of a published board (see \`GET /layouts\`) or a whole layout document.
- \`runs\` are the passes of the self-test, in order. What was done to the board just before a run, a swap for
  example, stands in its \`changes\`; chips move with a swap, sockets and shared parts do not.
- Evidence of kind \`code\` is what the machine showed, as it was typed, in one of the board's \`reportFormats\`.
  \`mask\`, \`lanes\` and \`pass\` say it without a format.
- Evidence that cannot be read is not an error of the request: its entry in \`evidence\` has \`ok: false\` and the
  \`reason\`, and the rest is weighed without it.
- \`headline\` says what to do, \`probability\` and \`sure\` how sure that is, \`suspects\` and \`places\` give the whole
  ranking, \`untested\` and \`unexplained\` what is not known.
`;

export const diagnosisRoutes: readonly Route[] = [
  route({
    method: 'post',
    path: '/diagnoses',
    may: 'guest',
    tag: 'diagnoses',
    summary: 'From what a board reported to the socket to pull.',
    details,
    example: diagnosisExample,
    body: diagnosisRequest,
    bodyBytes: limits.layoutBytes,
    answer: { status: 200, schema: diagnosisAnswer, words: 'The diagnosis.' },
    problems: ['not-found', 'layout-retired', 'layout-invalid', 'too-many-requests'],
    handler: async ({ context, body }) => ok(await diagnoseRuns(context, body)),
  }),
];
