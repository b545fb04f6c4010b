// What the pages do better with a script. Nothing depends on it: the grid is a table of inputs, and the answer has its link.
'use strict';

// The address is the document: after a posted form the address bar shows the answer's own address, so that reloading, keeping and
// sending it need no second post.
const answer = document.getElementById('answer');
if (answer?.dataset.address) {
  history.replaceState(null, '', answer.dataset.address);
}

// A unit that is chosen elsewhere in the form follows the choice.
for (const unit of document.querySelectorAll('[data-unit-of]')) {
  const choice = document.getElementById(unit.dataset.unitOf);
  choice?.addEventListener('change', () => { unit.textContent = choice.selectedOptions[0].text; });
}

const grid = document.querySelector('table.cells');
if (grid) {
  grid.addEventListener('keydown', move);
  grid.addEventListener('paste', paste);
}

function place(input) {
  const cell = input.closest('td');
  return { row: rows().indexOf(cell.parentElement), column: cell.cellIndex };
}

// Rows of inputs; a row that says what is wrong is none.
function rows() {
  return [...grid.tBodies[0].rows].filter((row) => row.querySelector('input'));
}

function inputAt(row, column) {
  return rows()[row]?.cells[column]?.querySelector('input');
}

// Up, Down and Enter go from row to row; Left and Right leave a cell only from the edge of its text.
function move(event) {
  const input = event.target;
  if (event.altKey || event.ctrlKey || event.metaKey || input.tagName !== 'INPUT') {
    return;
  }

  const { row, column } = place(input);
  const atStart = input.selectionStart === 0 && input.selectionEnd === 0;
  const atEnd = input.selectionStart === input.value.length;
  const steps = {
    ArrowUp: [-1, 0],
    ArrowDown: [1, 0],
    Enter: [event.shiftKey ? -1 : 1, 0],
    ArrowLeft: atStart && !event.shiftKey ? [0, -1] : null,
    ArrowRight: atEnd && !event.shiftKey ? [0, 1] : null,
  };
  const step = steps[event.key];
  const next = step && inputAt(row + step[0], column + step[1]);
  if (next) {
    event.preventDefault();
    next.focus();
    next.select();
  }
}

// A block copied from a spreadsheet fills the cells from the one that has the focus. What does not fit is not cut off: nothing is then
// pasted into the grid, and the table's own field takes it.
function paste(event) {
  const lines = event.clipboardData.getData('text/plain').replace(/\r/g, '').replace(/\n+$/, '').split('\n').map((line) => line.split('\t'));
  if (lines.length === 1 && lines[0].length === 1) {
    return;
  }

  event.preventDefault();
  const { row, column } = place(event.target);
  while (rows().length < row + lines.length && lengthen()) {
    // One row more each time, up to what the server reads.
  }

  const targets = lines.map((line, down) => line.map((_, right) => inputAt(row + down, column + right)));
  if (targets.flat().some((input) => !input)) {
    const table = document.getElementById('table');
    table.value = event.clipboardData.getData('text/plain');
    table.focus();
    return;
  }

  targets.forEach((inputs, down) => inputs.forEach((input, right) => { input.value = lines[down][right].trim(); }));
}

function lengthen() {
  const last = rows().at(-1);
  const number = rows().length;
  if (number >= Number(grid.dataset.most)) {
    return false;
  }

  const copy = last.cloneNode(true);
  copy.querySelectorAll('input').forEach((input, column) => {
    input.id = input.name = `cell-${number}-${column}`;
    input.value = '';
    input.removeAttribute('aria-invalid');
    input.removeAttribute('aria-describedby');
    input.setAttribute('aria-label', input.getAttribute('aria-label').replace(/\d+/, number + 1));
  });
  last.after(copy);
  return true;
}
