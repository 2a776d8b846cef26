import { createInterface } from 'node:readline';
import { readQuestion } from '#shared/question/read-question.ts';
import type { ReadOptions } from '#shared/question/reading-types.ts';
import { tiersFor } from '#shared/question/search-request.ts';

/**
 * Shows how a question is read, as JSON:
 *
 *     npm run --silent read-query -- "stalled at 700 °C"
 *     npm run --silent read-query -- --unit F "stuck at 900"
 *     npm run --silent read-query -- --tiers "cracked flat plate"
 *     npm run --silent read-query -- --batch < questions.txt     one JSON line for each line
 */
async function main(args: readonly string[]): Promise<void> {
  const unit = args.indexOf('--unit');
  const options: ReadOptions = { preferredUnit: args[unit + 1] === 'F' && unit >= 0 ? 'F' : 'C' };
  const tiers = args.includes('--tiers');
  const answer = (question: string): unknown => {
    const reading = readQuestion(question, options);
    return tiers ? { ...reading, tiers: tiersFor(reading) } : reading;
  };
  if (args.includes('--batch')) {
    for await (const line of createInterface({ input: process.stdin })) {
      process.stdout.write(`${JSON.stringify(answer(line))}\n`);
    }
    return;
  }
  const words = args.filter(
    (arg, index) => !arg.startsWith('--') && (unit < 0 || index !== unit + 1),
  );
  process.stdout.write(`${JSON.stringify(answer(words.join(' ')), null, 2)}\n`);
}

await main(process.argv.slice(2));
