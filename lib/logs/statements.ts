import type { Reading } from '@/shared';

/** Whether a remark says that the whole memory was tested and nothing else failed. */
export function saysRestPassed(text: string): boolean {
  if (/\bno (other|further|more) (error|failure|fault|address)/i.test(text)) return true;
  const rest =
    /\b(rest|all else|everything else|all others?|remainder)\b([^.;]*?)\b(clean|ok|okay|good|pass|passes|passed|right|fine)\b/i;
  const found = rest.exec(text);
  return found !== null && !/\b(not|never|un\w+)\b/i.test(found[2]!);
}

/** Whether a text without readings says that everything passed. */
export function saysAllPassed(text: string): boolean {
  return /\b(all|everything) (pass|passes|passed|ok|okay|clean|good|right|fine)\b|\b(no|0) (errors?|failures?|faults?)\b/i.test(
    text,
  );
}

/** "No even address failed": 0 for even, 1 for odd; null where the line does not say so. */
export function cleanParity(text: string): 0 | 1 | null {
  const found = /\bno (even|odd) (address(es)?|words?|locations?)\b.*\b(fail|error|bad|wrong)/i.exec(text);
  if (found === null) return null;
  return found[1]!.toLowerCase() === 'even' ? 0 : 1;
}

const radix = { hexadecimal: 16, octal: 8, decimal: 10 } as const;

/**
 * "... every 80 to 3FB5": the last reading goes on in steps. Null where the line does not say so, or the end does
 * not lie after the reading.
 */
export function goesOn(text: string, last: Reading, notation: keyof typeof radix): Reading | null {
  const found =
    /\b(?:every|in steps of|step) (?:0x|\$)?([0-9a-f]+)(?: hex| octal)?,? (?:up )?to (?:0x|\$)?([0-9a-f]+)\b/i.exec(
      text,
    );
  if (found === null) return null;
  const [step, to] = [found[1]!, found[2]!].map((digits) => Number.parseInt(digits, radix[notation])) as [
    number,
    number,
  ];
  const address = (last.to ?? last.address) + step;
  return step > 0 && to >= address ? { ...last, address, to, step } : null;
}
