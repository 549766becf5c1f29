import type { Nullable } from '@univerjs/core';
import {
  ArrayValueObject,
  AsyncObject,
  BaseFunction,
  type BaseReferenceObject,
  type BaseValueObject,
  BooleanValueObject,
  ErrorType,
  ErrorValueObject,
  NullValueObject,
  NumberValueObject,
  StringValueObject,
} from '@univerjs/engine-formula';
import { formatRect, quoteSheet } from '../grid/address.ts';
import { type CellErrorText, type CellValue, isCellError } from '../grid/cell.ts';
import type { CallArgument, CallResult, SheetFunction } from '../grid/grid.ts';

export interface CalledFrom {
  readonly sheet: string;
  readonly row: number;
  readonly column: number;
}

export interface HostFunctionHooks {
  sheetName(id: string): string;
  /** Told the outcome of each call, so that the sentences of errors can be shown beside the cell. */
  called(from: CalledFrom, result: CallResult): void;
}

/** Lets the calculation engine call a sheet function with blanks, errors and omitted arguments told apart. */
export class HostFunction extends BaseFunction {
  override needsReferenceObject = true;
  readonly sheetFunction: SheetFunction;
  readonly hooks: HostFunctionHooks;

  constructor(sheetFunction: SheetFunction, hooks: HostFunctionHooks) {
    super(sheetFunction.name);
    this.sheetFunction = sheetFunction;
    this.hooks = hooks;
    this.minParams = -1;
    this.maxParams = -1;
  }

  override isAsync(): boolean {
    return true;
  }

  /** A text written in a formula stays a text: without this the engine reads "2%" as 0.02. */
  override isArgumentsIgnoreNumberPattern(): boolean {
    return true;
  }

  // The engine passes reference objects where needsReferenceObject is set, though the base class's type omits them.
  override calculate(...given: (BaseValueObject | BaseReferenceObject)[]): BaseValueObject {
    const from: CalledFrom = { sheet: this.subUnitId ?? '', row: this.row, column: this.column };
    const place = {
      address: this.addressOf(from.sheet, from.row, from.column, from.row, from.column),
      argumentAddresses: given.map((one) => this.addressOfArgument(one)),
    };
    const finish = (result: CallResult): BaseValueObject => {
      this.hooks.called(from, result);
      return toEngine(result);
    };
    const fail = (thrown: unknown): BaseValueObject =>
      finish({ error: '#VALUE!', message: `the sheet could not call the function: ${String(thrown)}` });
    try {
      const result = this.sheetFunction.call(given.map(fromEngine), place);
      const promise =
        result instanceof Promise || (typeof result === 'object' && result !== null && 'then' in result);
      if (!promise) return finish(result);
      const later = new AsyncObject(Promise.resolve(result).then(finish, fail));
      // The engine awaits AsyncObject wherever a function is asynchronous; its types do not say so.
      return later as unknown as BaseValueObject;
    } catch (thrown) {
      return fail(thrown);
    }
  }

  private addressOfArgument(given: BaseValueObject | BaseReferenceObject): string | null {
    if (!isReference(given)) return null;
    const { range, sheetId } = given.toUnitRange();
    return this.addressOf(sheetId, range.startRow, range.startColumn, range.endRow, range.endColumn);
  }

  private addressOf(sheet: string, top: number, left: number, bottom: number, right: number): string {
    return `${quoteSheet(this.hooks.sheetName(sheet))}!${formatRect({ top, left, bottom, right })}`;
  }
}

function isReference(value: BaseValueObject | BaseReferenceObject): value is BaseReferenceObject {
  return value.isReferenceObject();
}

function fromEngine(given: BaseValueObject | BaseReferenceObject): CallArgument {
  if (isReference(given)) return { kind: 'matrix', values: cellsOf(given), fromCell: true };
  const value = given;
  if (value.isArray()) {
    // Checked by isArray.
    const rows = (value as ArrayValueObject).getArrayValue();
    return { kind: 'matrix', values: rows.map((row) => row.map(cellFromEngine)), fromCell: false };
  }
  return { kind: 'scalar', value: cellFromEngine(value), fromCell: false };
}

/** The cells of a range; one that was cleared, which the engine calls an empty text, is a blank. */
function cellsOf(range: BaseReferenceObject): CellValue[][] {
  const { startRow, startColumn } = range.getRangePosition();
  return range
    .toArrayValueObject()
    .getArrayValue()
    .map((row, down) =>
      row.map((cell, across) => {
        const value = cellFromEngine(cell);
        if (value !== '' && value !== null) return value;
        return isEmptyText(range, startRow + down, startColumn + across) ? '' : null;
      }),
    );
}

/** A formula, here or spilling over from elsewhere, can leave an empty text; nothing typed into a cell can. */
function isEmptyText(range: BaseReferenceObject, row: number, column: number): boolean {
  const own = range.getCurrentActiveSheetData().cellData.getValue(row, column);
  if (own?.f || own?.si) return true;
  const spilled =
    range.getCurrentRuntimeActiveArrayFormulaCellData()?.getValue(row, column) ??
    range.getCurrentActiveArrayFormulaCellData()?.getValue(row, column);
  return spilled?.v === '';
}

function cellFromEngine(value: Nullable<BaseValueObject>): CellValue {
  if (!value || value.isNull()) return null;
  // An error object carries its code as an ErrorType, whose values are the texts of CellErrorText.
  if (value.isError()) return { error: (value as ErrorValueObject).getErrorType() as CellErrorText };
  const plain = value.getValue();
  return typeof plain === 'number' || typeof plain === 'string' || typeof plain === 'boolean' ? plain : null;
}

function toEngine(result: CallResult): BaseValueObject {
  if (!isMatrix(result)) return cellToEngine(result);
  const rows = result.map((row) => row.map(cellToEngine));
  return ArrayValueObject.create({
    calculateValueList: rows,
    rowCount: rows.length,
    columnCount: rows[0]?.length ?? 0,
    unitId: '',
    sheetId: '',
    row: -1,
    column: -1,
  });
}

export function isMatrix(result: CallResult): result is readonly (readonly CellValue[])[] {
  return Array.isArray(result);
}

function cellToEngine(value: CellValue): BaseValueObject {
  if (value === null) return NullValueObject.create();
  if (typeof value === 'number') return NumberValueObject.create(value);
  if (typeof value === 'boolean') return BooleanValueObject.create(value);
  if (!isCellError(value)) return StringValueObject.create(value);
  const known = Object.values(ErrorType).find((type) => type === value.error);
  return ErrorValueObject.create(known ?? ErrorType.VALUE);
}
