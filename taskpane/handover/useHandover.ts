import { useEffect, useRef, useState } from 'preact/hooks';
import { Problem } from '../../core/problem.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import { HostTrouble, type Workbook } from '../host/workbook.ts';
import { freeze, thaw } from './freeze.ts';
import { loadPlaced, type Placed, savePlaced } from './records.ts';
import { takeBack } from './takeBack.ts';

/** A question in the panel, and how to answer it. */
export interface Question {
  readonly text: string;
  readonly yes: string;
  readonly answer: (agreed: boolean) => void;
}

/** What the hand-over section shows and may ask for. */
export interface HandoverDesk {
  readonly placed: readonly Placed[];
  readonly question: Question | null;
  readonly busy: boolean;
  /** What stood in the way, in a sentence; empty when nothing does. */
  readonly trouble: string;
  /** Number for what is placed next. */
  readonly next: number;
  /** Does host work, one at a time; what it returns is kept among what was placed. */
  place(work: (ask: Ask) => Promise<Placed | null>, written: (placed: Placed) => string): Promise<void>;
  freeze(placed: Placed): Promise<void>;
  thaw(placed: Placed): Promise<void>;
  takeBack(placed: Placed): Promise<void>;
}

type Ask = (question: string, yes: string) => Promise<boolean>;

/** Keeps what was handed over, in step with the workbook's own record of it. */
export function useHandover(workbook: Workbook, say: (message: string) => void): HandoverDesk {
  const [placed, setPlaced] = useState<readonly Placed[]>([]);
  const [question, setQuestion] = useState<Question | null>(null);
  const [busy, setBusy] = useState(false);
  const [trouble, setTrouble] = useState('');
  const working = useRef(false);

  useEffect(() => {
    let ended = false;
    void loadPlaced(workbook).then(
      (found) => !ended && setPlaced(found),
      (error: unknown) => !ended && setTrouble(sentenceOf(error)),
    );
    return () => {
      ended = true;
    };
  }, [workbook]);

  const keep = async (next: readonly Placed[]): Promise<void> => {
    setPlaced(next);
    await savePlaced(workbook, next);
  };
  const ask: Ask = (text, yes) =>
    new Promise((resolve) => {
      const answer = (agreed: boolean): void => {
        setQuestion(null);
        resolve(agreed);
      };
      setQuestion({ text, yes, answer });
    });
  const alone = async (work: () => Promise<void>): Promise<void> => {
    if (working.current) return;
    working.current = true;
    setBusy(true);
    setTrouble('');
    try {
      await work();
    } catch (error) {
      setTrouble(sentenceOf(error));
    } finally {
      working.current = false;
      setBusy(false);
      setQuestion(null);
    }
  };
  const replaced = (next: Placed): readonly Placed[] =>
    placed.map((one) => (one.id === next.id ? next : one));

  return {
    placed,
    question,
    busy,
    trouble,
    next: 1 + Math.max(0, ...placed.map(({ id }) => Number(id.split('-')[1] ?? 0))),
    place: (work, written) =>
      alone(async () => {
        const result = await work(ask);
        if (result === null) {
          say(handoverWords.kept);
          return;
        }
        await keep([...placed, result]);
        say(written(result));
      }),
    freeze: (one) =>
      alone(async () => {
        await keep(replaced(await freeze(workbook, one)));
        say(handoverWords.frozenNow(handoverWords.kind[one.kind]));
      }),
    thaw: (one) =>
      alone(async () => {
        await keep(replaced(await thaw(workbook, one)));
        say(handoverWords.thawedNow(handoverWords.kind[one.kind]));
      }),
    takeBack: (one) =>
      alone(async () => {
        if (!(await takeBack(workbook, one, ask))) return;
        await keep(placed.filter(({ id }) => id !== one.id));
        say(handoverWords.takenBack(handoverWords.kind[one.kind]));
      }),
  };
}

/** What the user is told; a fault of the program itself goes on. */
function sentenceOf(error: unknown): string {
  if (error instanceof HostTrouble || error instanceof Problem) return error.message;
  throw error;
}
