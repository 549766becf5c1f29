(() => {
  window.errorsWereLate = CustomFunctions.Error === undefined;
  const sum = (cells) => {
    if (!Array.isArray(cells))
      throw new CustomFunctions.Error(CustomFunctions.ErrorCode.invalidValue, 'no range');
    return cells.flat().reduce((total, cell) => total + (typeof cell === 'number' ? cell : 0), 0);
  };
  CustomFunctions.associate('constants', (x, y) => [
    ['constant', 'value'],
    ['sum of x', sum(x)],
    ['sum of y', sum(y)],
  ]);
  CustomFunctions.associate('STATEMENT', () => {
    throw new CustomFunctions.Error(CustomFunctions.ErrorCode.notAvailable, 'this add-in has no words');
  });
})();
