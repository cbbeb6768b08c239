import fs from 'node:fs';
import path from 'node:path';
import ts from 'typescript';

/**
 * What the compiler knows of the functions a folder exports: where they stand, the comment above
 * them and the arguments a formula card has to explain.
 */
export interface CalcFunction {
  readonly name: string;
  readonly file: string;
  readonly line: number;
  /** The comment directly above, as written, or null. */
  readonly comment: string | null;
  readonly arguments: readonly Argument[];
}

export interface Argument {
  readonly name: string;
  /** Sets of table rows; one of them has to be there in full. */
  readonly explainedBy: readonly (readonly string[])[];
}

export const filesIn = (folder: string): string[] =>
  fs
    .readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((file) => file.endsWith('.ts'))
    .map((file) => path.join(folder, file))
    .sort();

/** A program over files on disk and, for tests of the reader itself, files that exist only here. */
export function programOf(
  root: string,
  files: readonly string[],
  unsaved: Readonly<Record<string, string>> = {},
): ts.Program {
  const config = ts.readConfigFile(path.join(root, 'tsconfig.json'), (file) =>
    ts.sys.readFile(file),
  );
  const { options } = ts.parseJsonConfigFileContent(config.config, ts.sys, root);
  const read: ts.CompilerOptions = { ...options, incremental: false, noEmit: true, types: [] };
  delete read.tsBuildInfoFile;
  const disk = ts.createCompilerHost(read);
  const host: ts.CompilerHost = {
    ...disk,
    fileExists: (file) => file in unsaved || disk.fileExists(file),
    readFile: (file) => unsaved[file] ?? disk.readFile(file),
    getSourceFile: (file, target, ...rest) => {
      const text = unsaved[file];
      return text === undefined
        ? disk.getSourceFile(file, target, ...rest)
        : ts.createSourceFile(file, text, target);
    },
  };
  return ts.createProgram([...files, ...Object.keys(unsaved)], read, host);
}

/** Exported names of a file that are declared in it, with their declarations. */
function declaredExports(program: ts.Program, file: string): [ts.Symbol, ts.Declaration[]][] {
  const checker = program.getTypeChecker();
  const source = program.getSourceFile(file);
  const module = source && checker.getSymbolAtLocation(source);
  if (!module) return [];
  return checker.getExportsOfModule(module).map((exported) => {
    const isAlias = (exported.flags & ts.SymbolFlags.Alias) !== 0;
    const symbol = isAlias ? checker.getAliasedSymbol(exported) : exported;
    const here = (symbol.declarations ?? []).filter((node) => node.getSourceFile() === source);
    return [symbol, here];
  });
}

/** Every exported function declaration. Of an overloaded one, every signature a caller sees. */
export function functionsOf(program: ts.Program, files: readonly string[]): CalcFunction[] {
  return files.flatMap((file) =>
    declaredExports(program, file).flatMap(([symbol, declarations]) => {
      const all = declarations.filter(ts.isFunctionDeclaration);
      const signatures = all.filter(({ body }) => !body);
      return (signatures.length > 0 ? signatures : all).map((node) =>
        describeFunction(program, symbol.name, node),
      );
    }),
  );
}

function describeFunction(
  program: ts.Program,
  name: string,
  node: ts.FunctionDeclaration,
): CalcFunction {
  const source = node.getSourceFile();
  const comment = ts.getJSDocCommentsAndTags(node).filter(ts.isJSDoc).at(-1);
  return {
    name,
    file: source.fileName,
    line: source.getLineAndCharacterOfPosition(node.getStart(source)).line + 1,
    comment: comment ? source.text.slice(comment.pos, comment.end) : null,
    arguments: node.parameters.map((parameter) =>
      describeArgument(program, parameter, node.parameters.length === 1),
    ),
  };
}

/** `export const f = (…) => …`: a function that no card is asked of. */
export function arrowsOf(program: ts.Program, file: string): string[] {
  const checker = program.getTypeChecker();
  return declaredExports(program, file)
    .filter(([symbol, declarations]) =>
      declarations.some(
        (node) =>
          ts.isVariableDeclaration(node) &&
          checker.getTypeOfSymbol(symbol).getCallSignatures().length > 0,
      ),
    )
    .map(([symbol]) => symbol.name);
}

/** Files a file imports or re-exports by relative path. */
export const importsOf = (file: string): string[] =>
  ts
    .preProcessFile(fs.readFileSync(file, 'utf8'))
    .importedFiles.filter(({ fileName }) => fileName.startsWith('.'))
    .map(({ fileName }) => path.resolve(path.dirname(file), fileName));

/**
 * A plain argument needs a row. An object that is the only argument needs a row for each property,
 * unless it is a thing with a name (a pattern, a material) that holds no bare number and so
 * carries no unit. Beside other arguments an object may do either.
 */
function describeArgument(
  program: ts.Program,
  parameter: ts.ParameterDeclaration,
  alone: boolean,
): Argument {
  const checker = program.getTypeChecker();
  const type = checker.getNonNullableType(checker.getTypeAtLocation(parameter));
  const name = ts.isIdentifier(parameter.name) ? parameter.name.text : null;
  const properties = propertiesOf(program, type);
  if (properties === null) {
    const own = name ?? parameter.name.getText();
    return { name: own, explainedBy: [[own]] };
  }
  const each = [...new Set(properties.map((property) => property.name))];
  const holdsNumbers = properties.some((property) =>
    isNumber(checker.getNonNullableType(checker.getTypeOfSymbol(property))),
  );
  const mayStandForAll = name !== null && (!alone || (isNamed(program, type) && !holdsNumbers));
  return {
    name: name ?? each.join(', '),
    explainedBy: mayStandForAll ? [each, [name]] : [each],
  };
}

const kinds = (type: ts.Type): ts.Type[] => (type.isUnion() ? type.types : [type]);

const isPrimitive = (type: ts.Type): boolean =>
  type.isIntersection()
    ? type.types.some(isPrimitive)
    : (type.flags & (ts.TypeFlags.Object | ts.TypeFlags.TypeParameter)) === 0;

const isNumber = (type: ts.Type): boolean =>
  type.isIntersection()
    ? type.types.some(isNumber)
    : kinds(type).some(({ flags }) => (flags & ts.TypeFlags.NumberLike) !== 0);

const isLibrary = (program: ts.Program, symbol: ts.Symbol | undefined): boolean =>
  (symbol?.declarations ?? []).some((node) =>
    program.isSourceFileDefaultLibrary(node.getSourceFile()),
  );

/** A Map or a Date is one thing; Pick and Partial come from the library without a name. */
const isLibraryThing = (program: ts.Program, symbol: ts.Symbol | undefined): boolean =>
  symbol?.name !== '__type' && isLibrary(program, symbol);

const isNamed = (program: ts.Program, type: ts.Type): boolean => {
  const symbol = type.aliasSymbol ?? type.getSymbol();
  return symbol !== undefined && symbol.name !== '__type' && !isLibrary(program, symbol);
};

/** Properties of a plain object, of every kind of it where there are several; else null. */
function propertiesOf(program: ts.Program, type: ts.Type): ts.Symbol[] | null {
  const checker = program.getTypeChecker();
  const found: ts.Symbol[] = [];
  for (const kind of kinds(checker.getBaseConstraintOfType(type) ?? type)) {
    if (isPrimitive(kind) || checker.isArrayLikeType(kind)) return null;
    if (kind.getCallSignatures().length > 0) return null;
    if (isLibraryThing(program, kind.getSymbol())) return null;
    found.push(...checker.getPropertiesOfType(kind));
  }
  return found.length > 0 ? found : null;
}
