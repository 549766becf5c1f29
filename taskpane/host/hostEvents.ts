import { asHostTrouble } from './hostTrouble.ts';

/**
 * Subscribes to an event of the host in a batch of its own.
 * @returns what ends the subscription; also before the host has confirmed it
 */
export function subscribe<E>(
  add: (context: Excel.RequestContext) => OfficeExtension.EventHandlerResult<E>,
): () => void {
  let ended = false;
  const subscribed = Excel.run(async (context) => {
    const handler = add(context);
    await context.sync();
    return handler;
  }).catch((error: unknown) => {
    // Without the event the panel still follows when asked to: "Read again" does what the event would have done.
    console.warn(asHostTrouble(error));
    return undefined;
  });
  return () => {
    if (ended) return;
    ended = true;
    void subscribed.then(async (handler) => {
      if (handler === undefined) return;
      await Excel.run(handler.context, async (context) => {
        handler.remove();
        await context.sync();
      });
    });
  };
}
