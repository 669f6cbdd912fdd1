import ts from 'typescript';

/** One small change to one file: the text from `start` to `end` replaced. */
export interface Mutant {
  file: string;
  line: number;
  start: number;
  end: number;
  before: string;
  after: string;
}

/** Operators and what each becomes, one mutant an entry. */
const OPERATORS: Record<string, readonly string[]> = {
  '+': ['-'],
  '-': ['+'],
  '*': ['/'],
  '/': ['*'],
  '%': ['*'],
  '**': ['*'],
  '+=': ['-='],
  '-=': ['+='],
  '*=': ['/='],
  '/=': ['*='],
  '<': ['<=', '>='],
  '<=': ['<', '>'],
  '>': ['>=', '<='],
  '>=': ['>', '<'],
  '===': ['!=='],
  '!==': ['==='],
  '&&': ['||'],
  '||': ['&&'],
};

const METHODS: Record<string, string> = {
  max: 'min',
  min: 'max',
  floor: 'ceil',
  ceil: 'floor',
  round: 'floor',
  some: 'every',
  every: 'some',
  sin: 'cos',
  cos: 'sin',
};

/**
 * What stands behind `??` after an indexed access is never reached: the compiler asks for it because it cannot see that the index lies within the
 * array. A change to it could not be caught by any test.
 */
function unreachable(node: ts.Node): boolean {
  const parent: ts.Node | undefined = node.parent;
  if (parent === undefined) return false;
  if (
    !ts.isBinaryExpression(parent) ||
    parent.operatorToken.kind !== ts.SyntaxKind.QuestionQuestionToken ||
    parent.right !== node
  )
    return false;
  const reads = (left: ts.Node): boolean =>
    ts.isElementAccessExpression(left) ||
    (ts.isPropertyAccessExpression(left) && left.questionDotToken !== undefined) ||
    (ts.isCallExpression(left) && /\.at$/.test(left.expression.getText()));
  return reads(parent.left);
}

/** Types say nothing at run time, messages are for the log, and an import is no place for a mistake of arithmetic. */
function skipped(node: ts.Node): boolean {
  return (
    ts.isTypeNode(node) ||
    ts.isTypeAliasDeclaration(node) ||
    ts.isInterfaceDeclaration(node) ||
    ts.isImportDeclaration(node) ||
    ts.isExportDeclaration(node) ||
    ts.isTemplateExpression(node)
  );
}

function numberTexts(text: string): string[] {
  const value = Number(text.replaceAll('_', ''));
  if (text.endsWith('n')) return [`${BigInt(text.slice(0, -1).replaceAll('_', '')) + 1n}n`];
  return value === 0 ? ['1'] : [String(value + 1), String(value * 0.5)];
}

/** Every change to operators, constants and comparisons of one source file. */
export function mutantsOf(file: string, source: string): Mutant[] {
  const tree = ts.createSourceFile(file, source, ts.ScriptTarget.ES2022, true);
  const found: Mutant[] = [];
  const add = (node: ts.Node, after: string): void => {
    const start = node.getStart(tree);
    found.push({
      file,
      line: tree.getLineAndCharacterOfPosition(start).line + 1,
      start,
      end: node.getEnd(),
      before: node.getText(tree),
      after,
    });
  };
  const visit = (node: ts.Node): void => {
    if (skipped(node) || unreachable(node)) return;
    if (ts.isBinaryExpression(node))
      for (const after of OPERATORS[node.operatorToken.getText(tree)] ?? []) add(node.operatorToken, after);
    if (ts.isNumericLiteral(node) || ts.isBigIntLiteral(node))
      for (const after of numberTexts(node.getText(tree))) add(node, after);
    if (node.kind === ts.SyntaxKind.TrueKeyword) add(node, 'false');
    if (node.kind === ts.SyntaxKind.FalseKeyword) add(node, 'true');
    if (
      ts.isPrefixUnaryExpression(node) &&
      (node.operator === ts.SyntaxKind.MinusToken || node.operator === ts.SyntaxKind.ExclamationToken)
    ) {
      add(node, `(${node.operand.getText(tree)})`);
    }
    if (ts.isPropertyAccessExpression(node) && ts.isCallExpression(node.parent) && node.parent.expression === node) {
      const other = METHODS[node.name.text];
      if (other !== undefined) add(node.name, other);
    }
    node.forEachChild(visit);
  };
  visit(tree);
  return found;
}
