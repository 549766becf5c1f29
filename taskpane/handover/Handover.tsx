import { useLayoutEffect, useRef, useState } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import { formatBlock, parseBlock, qualified, splitAddress } from '../host/address.ts';
import { HostTrouble, type Workbook } from '../host/workbook.ts';
import type { Choice } from '../state/choice.ts';
import { mainConstant } from '../state/mainConstant.ts';
import { Choose, Field, Part } from '../views/parts.tsx';
import { cardPictures } from './cardPictures.ts';
import { freeCorner } from './freeCorner.ts';
import { handOver } from './handOver.ts';
import { type Corner, liveBlock } from './liveBlock.ts';
import { type HandoverKind, handoverKinds, type Placed } from './records.ts';
import { type Question, useHandover } from './useHandover.ts';
import { useRenewedPictures } from './useRenewedPictures.ts';
import { wholeFit } from './wholeFit.ts';
import { withRoom } from './withRoom.ts';

/** The panel's last section: puts results into the workbook, freezes them, takes them back. */
export function Handover(props: {
  readonly choice: Choice;
  readonly fit: Fit;
  readonly workbook: Workbook;
  readonly say: (message: string) => void;
}) {
  const { choice, fit, workbook, say } = props;
  const desk = useHandover(workbook, say);
  const [where, setWhere] = useState('');
  const [wanted, setWanted] = useState('');
  useRenewedPictures(desk.placed, choice, fit, workbook);
  const names = fit.constants.map(({ name }) => name);
  const constant = mainConstant(fit, names, wanted);

  const corner = async (whole: Fit): Promise<Corner> => {
    const { sheet, cells } = splitAddress(where.trim());
    const on = sheet === '' ? choice.y.sheet : sheet;
    if (where.trim() !== '') {
      const block = parseBlock(cells);
      if (block === undefined) throw new HostTrouble('selection', handoverWords.whereWrong(where));
      return { sheet: on, row: block.top, column: block.left };
    }
    const { block } = liveBlock(choice, whole, { sheet: on, row: 0, column: 0 }, constant);
    return freeCorner(workbook, choice, block);
  };
  const place = (kind: HandoverKind): Promise<void> =>
    desk.place(
      async (ask) => {
        // Workings show reading by reading what there is; everything else goes on with the readings.
        const roomy = kind === 'workings' ? choice : await withRoom(workbook, choice);
        const whole = await wholeFit(workbook, roomy);
        const task = {
          kind,
          choice: roomy,
          of: choice,
          fit: whole,
          constant,
          corner: kind === 'block' ? await corner(whole) : { sheet: '', row: 0, column: 0 },
          date: today(),
          draw: cardPictures,
          number: desk.next,
        };
        return handOver(workbook, task, ask);
      },
      ({ sheet, address }) => handoverWords.written(handoverWords.kind[kind], qualified(sheet, address)),
    );

  return (
    <Part title={handoverWords.title} kind="handover">
      <p class="lead">{handoverWords.lead}</p>
      {choice.leftOut.length > 0 && <p class="hint">{handoverWords.leftOut(choice.leftOut)}</p>}
      <ul class="hand-overs">
        {handoverKinds.map((kind) => (
          <li key={kind}>
            <div>
              <p class="strong">{handoverWords.kind[kind]}</p>
              <p class="hint">{handoverWords.about[kind]}</p>
            </div>
            <button type="button" aria-disabled={desk.busy} onClick={() => void place(kind)}>
              {handoverWords.place[kind]}
            </button>
            {kind === 'block' && (
              <div class="with-button place-field">
                <Field
                  label={handoverWords.where}
                  value={where}
                  placeholder={handoverWords.whereAuto}
                  onCommit={setWhere}
                />
                <button type="button" onClick={() => void takeSelected(workbook, choice, setWhere)}>
                  {handoverWords.whereSelected}
                </button>
              </div>
            )}
            {kind === 'charts' && fit.law.curve === null && (
              <p class="hint">{handoverWords.chartsNeedCurve(fit.law.response)}</p>
            )}
            {kind === 'card' && names.length > 1 && (
              <Choose
                label={handoverWords.constant}
                value={constant}
                options={names.map((name) => [name, name])}
                onChoose={setWanted}
              />
            )}
          </li>
        ))}
      </ul>
      {desk.question !== null && <Asked question={desk.question} />}
      {desk.trouble !== '' && (
        <p class="notice stop" role="alert">
          {desk.trouble}
        </p>
      )}
      {desk.placed.length > 0 && <h4>{handoverWords.placed}</h4>}
      <ul class="placed">
        {desk.placed.map((placed) => (
          <li key={placed.id}>
            <p>
              {handoverWords.placedAt(
                handoverWords.kind[placed.kind],
                qualified(placed.sheet, placed.address),
              )}
              <span class="hint"> {placed.frozen === null ? handoverWords.live : handoverWords.frozen}</span>
            </p>
            <PlacedButtons
              placed={placed}
              busy={desk.busy}
              show={() => void workbook.select(placed).catch(() => undefined)}
              freeze={() => void desk.freeze(placed)}
              thaw={() => void desk.thaw(placed)}
              takeBack={() => void desk.takeBack(placed)}
            />
          </li>
        ))}
      </ul>
    </Part>
  );
}

function PlacedButtons(props: {
  readonly placed: Placed;
  readonly busy: boolean;
  readonly show: () => void;
  readonly freeze: () => void;
  readonly thaw: () => void;
  readonly takeBack: () => void;
}) {
  const { placed, busy, show, freeze, thaw, takeBack } = props;
  const what = handoverWords.placedAt(
    handoverWords.kind[placed.kind],
    qualified(placed.sheet, placed.address),
  );
  const frozen = placed.frozen !== null;
  return (
    <div class="buttons">
      <button type="button" onClick={show}>
        {handoverWords.show}
      </button>
      <button
        type="button"
        aria-disabled={busy}
        aria-label={frozen ? handoverWords.thawOf(what) : handoverWords.freezeOf(what)}
        onClick={frozen ? thaw : freeze}
      >
        {frozen ? handoverWords.thaw : handoverWords.freeze}
      </button>
      <button
        type="button"
        aria-disabled={busy}
        aria-label={handoverWords.takeBackOf(what)}
        onClick={takeBack}
      >
        {handoverWords.takeBack}
      </button>
    </div>
  );
}

/** A question with its two answers, in the panel itself. */
function Asked(props: { readonly question: Question }) {
  const { text, yes, answer } = props.question;
  const no = useRef<HTMLButtonElement>(null);
  useLayoutEffect(() => no.current?.focus(), []);
  return (
    <div class="notice note" role="alertdialog" aria-label={text}>
      <p>{text}</p>
      <div class="buttons">
        <button type="button" onClick={() => answer(true)}>
          {yes}
        </button>
        <button type="button" ref={no} onClick={() => answer(false)}>
          {handoverWords.keep}
        </button>
      </div>
    </div>
  );
}

async function takeSelected(
  workbook: Workbook,
  choice: Choice,
  take: (address: string) => void,
): Promise<void> {
  const address = await workbook.run(async (context) => {
    const cell = context.workbook.getActiveCell().load('address');
    await context.sync();
    return cell.address;
  });
  const { sheet, cells } = splitAddress(address);
  const block = parseBlock(cells);
  if (block === undefined) return;
  const cell = formatBlock({ ...block, bottom: block.top, right: block.left });
  take(sheet === choice.y.sheet ? cell : qualified(sheet, cell));
}

/** The day by the user's own clock: `2026-03-09`. */
function today(): string {
  const now = new Date();
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}
