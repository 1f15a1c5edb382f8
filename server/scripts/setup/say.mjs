/** A reason to give up that is told in one line; anything else is a defect and shows its stack. */
export class GiveUp extends Error {}

/** Ends the process with one clear line and a non-zero exit code. */
export const giveUp = (error) => {
  process.stderr.write(error instanceof GiveUp ? `Rowcall: ${error.message}\n` : `${error?.stack ?? error}\n`);
  process.exit(1);
};

/** Tells what is being done. */
export const say = (line) => process.stdout.write(`${line}\n`);
