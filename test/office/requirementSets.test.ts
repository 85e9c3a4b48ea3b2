import { readFileSync, readdirSync } from "node:fs";
import { join } from "node:path";
import ts from "typescript";
import { describe, expect, it } from "vitest";
import { floor } from "../../src/office/session.ts";

const root = join(import.meta.dirname, "../..");

/** "range#rowHidden" -> 1.2, from the API's reference pages. */
const setOf = new Map(
  readFileSync(join(root, "test/reference/excel/requirement-sets.tsv"), "utf8")
    .split("\n")
    .flatMap((line) => {
      const found = /^excel\.(\w+)#(\w+)[^\t]*\tExcelApi (\d+\.\d+)/.exec(line);
      return found === null ? [] : [[`${found[1]}#${found[2]}`.toLowerCase(), found[3]!] as const];
    }),
);

/** Proxies, collections and contexts are the client library's own, as old as the library. */
const ofTheClient = /^requestcontext#|#(context|items|load)$/;

interface Use {
  readonly member: string;
  readonly where: string;
}

/** Every member of Excel's object model that the office room names: accessed in code or listed in a load(). */
function usedMembers(): Use[] {
  const folder = join(root, "src/office");
  const files = readdirSync(folder).map((file) => join(folder, file));
  const config = ts.readConfigFile(join(root, "tsconfig.json"), (file) => ts.sys.readFile(file));
  const { options } = ts.parseJsonConfigFileContent(config.config, ts.sys, root);
  const program = ts.createProgram(files, options);
  const checker = program.getTypeChecker();
  const uses: Use[] = [];

  const classesOf = ({ declarations = [] }: ts.Symbol): string[] =>
    declarations.flatMap(({ parent }) => {
      if (!(ts.isClassDeclaration(parent) || ts.isInterfaceDeclaration(parent))) return [];
      const module = ts.isModuleBlock(parent.parent) ? parent.parent.parent.name.text : "";
      return module === "Excel" ? [parent.name!.text] : [];
    });
  const note = (symbol: ts.Symbol | undefined, node: ts.Node): void => {
    const file = node.getSourceFile();
    const where = `${file.fileName.slice(root.length + 1)}:${file.getLineAndCharacterOfPosition(node.getStart()).line + 1}`;
    for (const owner of symbol === undefined ? [] : classesOf(symbol)) {
      const member = `${owner}#${symbol!.name}`.toLowerCase();
      if (!ofTheClient.test(member)) uses.push({ member, where });
    }
  };
  const textOf = (node: ts.Expression): string => {
    if (ts.isStringLiteralLike(node)) return node.text;
    if (ts.isTemplateExpression(node))
      return node.head.text + node.templateSpans.map((span) => textOf(span.expression) + span.literal.text).join("");
    const type = checker.getTypeAtLocation(node);
    if (type.isStringLiteral()) return type.value;
    throw new Error(`A load() whose members cannot be read: ${node.getText()}`);
  };
  const followPath = (type: ts.Type, path: string, node: ts.Node): void => {
    let at = type;
    for (const step of path.split("/").map((part) => part.trim())) {
      const symbol = checker.getPropertyOfType(at, step);
      if (symbol === undefined) throw new Error(`There is no ${path} to load at ${node.getText()}`);
      note(symbol, node);
      at = checker.getTypeOfSymbol(symbol);
      const element = checker.getIndexTypeOfType(at, ts.IndexKind.Number);
      if (step === "items" && element !== undefined) at = element;
    }
  };
  const visit = (node: ts.Node): void => {
    if (ts.isPropertyAccessExpression(node)) note(checker.getSymbolAtLocation(node.name), node);
    if (ts.isBindingElement(node) && ts.isObjectBindingPattern(node.parent)) {
      const name = (node.propertyName ?? node.name).getText();
      note(checker.getPropertyOfType(checker.getTypeAtLocation(node.parent), name), node);
    }
    const loads = ts.isCallExpression(node) && ts.isPropertyAccessExpression(node.expression);
    if (loads && node.expression.name.text === "load") {
      const type = checker.getTypeAtLocation(node.expression.expression);
      for (const path of textOf(node.arguments[0]!).split(",")) followPath(type, path, node);
    }
    ts.forEachChild(node, visit);
  };
  for (const file of files) visit(program.getSourceFile(file)!);
  return uses;
}

const newerThan = (version: string, other: string): boolean => {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  const [otherMajor = 0, otherMinor = 0] = other.split(".").map(Number);
  return major > otherMajor || (major === otherMajor && minor > otherMinor);
};

describe("members of Excel's object model that the office room uses", () => {
  const uses = usedMembers();

  it("finds them, in code and in load()", () => {
    const members = new Set(uses.map(({ member }) => member));
    expect(members.size).toBeGreaterThan(60);
    for (const known of ["range#valuetypes", "worksheetcollection#add", "table#showtotals", "chartseries#setvalues"]) {
      expect(members).toContain(known);
    }
  });

  it("has the requirement set of each", () => {
    expect([...new Set(uses.map(({ member }) => member).filter((member) => !setOf.has(member)))]).toEqual([]);
  });

  it("stays at or below the floor that is asked for at run time", () => {
    const above = uses.filter(({ member }) => newerThan(setOf.get(member) ?? "0.0", floor.version));
    expect(above.map(({ member, where }) => `${where} ${member} ${setOf.get(member) ?? ""}`)).toEqual([]);
  });
});
