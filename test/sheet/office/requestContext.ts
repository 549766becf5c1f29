import type { Book } from './book.ts';
import { HostError } from './hostError.ts';

/** One step of a batch: run in order when the batch is synchronised. */
export interface Step {
  readonly name: string;
  /** Whether cells must have finished calculating before this step reads them. */
  readonly reads: boolean;
  /** Whether this step changes cells. */
  readonly writes: boolean;
  run(): void | Promise<void>;
}

/** The queue between the add-in's proxy objects and the sheet: nothing happens before `sync`. */
export class RequestContext {
  readonly book: Book;
  private steps: Step[] = [];
  private wrote = false;

  constructor(book: Book) {
    this.book = book;
  }

  enqueue(step: Step): void {
    this.steps.push(step);
  }

  /** Runs what is queued; a step that fails ends the batch and rejects with its error. */
  async sync<T>(passThrough?: T): Promise<T | undefined> {
    const steps = this.steps;
    this.steps = [];
    await this.book.roundTrip();
    for (const step of steps) {
      this.failIfAsked(step.name);
      if (step.reads && this.wrote) {
        await this.book.grid.settle(10_000);
        this.wrote = false;
      }
      await step.run();
      if (step.writes) this.wrote = true;
    }
    this.failIfAsked('sync');
    return passThrough;
  }

  private failIfAsked(step: string): void {
    const fault = this.book.takeFault(step);
    if (fault) throw new HostError(fault.code, fault.message, step);
  }
}
