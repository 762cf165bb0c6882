import { readFileSync, readdirSync } from "node:fs";
import { dirname, join, relative, resolve } from "node:path";
import ts from "typescript";
import { describe, expect, it } from "vitest";

/**
 * Holds the directions of architecture: `lib/calc` <- `lib/notify` <- `templates` <- `db`, `lib/server` <- `app`.
 * The layers are the project's own; there is no outside source for them.
 */

const root = resolve(import.meta.dirname, "..");
const folders = ["app", "components", "db", "lib", "scripts", "templates", "tests"];
const rootFiles = ["instrumentation.ts", "proxy.ts"];

const filesUnder = (folder: string): string[] =>
  readdirSync(join(root, folder), { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /\.(ts|tsx|mts|mjs)$/.test(entry.name))
    .map((entry) => relative(root, join(entry.parentPath, entry.name)));

type Import = { from: string; typeOnly: boolean };
type Source = { path: string; text: string; tree: ts.SourceFile; imports: Import[] };

/** `@/lib/x` and `./x` as paths from the root; packages as they are. */
function place(path: string, specifier: string): string {
  if (specifier.startsWith("@/")) return specifier.slice(2);
  return specifier.startsWith(".") ? relative(root, resolve(root, dirname(path), specifier)) : specifier;
}

function importsOf(path: string, tree: ts.SourceFile): Import[] {
  const found: Import[] = [];
  const visit = (node: ts.Node) => {
    if (ts.isImportDeclaration(node) && ts.isStringLiteral(node.moduleSpecifier)) {
      const typeOnly = node.importClause?.phaseModifier === ts.SyntaxKind.TypeKeyword;
      found.push({ from: place(path, node.moduleSpecifier.text), typeOnly });
    } else if (ts.isExportDeclaration(node) && node.moduleSpecifier && ts.isStringLiteral(node.moduleSpecifier)) {
      found.push({ from: place(path, node.moduleSpecifier.text), typeOnly: node.isTypeOnly });
    } else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      const [argument] = node.arguments;
      if (argument && ts.isStringLiteral(argument)) found.push({ from: place(path, argument.text), typeOnly: false });
    }
    ts.forEachChild(node, visit);
  };
  visit(tree);
  return found;
}

const sources: Source[] = [...folders.flatMap(filesUnder), ...rootFiles].map((path) => {
  const text = readFileSync(join(root, path), "utf8");
  const tree = ts.createSourceFile(
    path,
    text,
    ts.ScriptTarget.ES2022,
    true,
    path.endsWith("x") ? ts.ScriptKind.TSX : undefined,
  );
  return { path, text, tree, imports: importsOf(path, tree) };
});

const inside = (path: string, layer: string) => path === layer || path.startsWith(`${layer}/`);
const of = (...layers: string[]) => sources.filter(({ path }) => layers.some((layer) => inside(path, layer)));
const isPackage = (from: string, name: string) => from === name || from.startsWith(`${name}/`);

/** Names read or called in real code: comments and strings do not count. */
function namesIn(source: Source, wanted: (node: ts.Node) => boolean): string[] {
  const found: string[] = [];
  const visit = (node: ts.Node) => {
    if (wanted(node)) found.push(`${source.path}: ${node.getText(source.tree)}`);
    ts.forEachChild(node, visit);
  };
  visit(source.tree);
  return found;
}

const member = (node: ts.Node, object: string, name: string) =>
  ts.isPropertyAccessExpression(node) && node.expression.getText() === object && node.name.text === name;

describe("import directions", () => {
  const mayNot: [layer: string, targets: string[]][] = [
    ["lib/calc", ["lib/notify", "templates", "db", "lib/server", "app", "components"]],
    ["lib/notify", ["templates", "db", "lib/server", "app", "components"]],
    ["templates", ["db", "lib/server", "app", "components"]],
    ["components", ["db", "lib/server", "app"]],
    ["db", ["app", "components"]],
    ["lib/server", ["app", "components"]],
  ];
  it.each(mayNot)("%s imports nothing of %j", (layer, targets) => {
    const wrong = of(layer).flatMap(({ path, imports }) =>
      imports
        .filter(({ from }) => targets.some((target) => inside(from, target)))
        .map(({ from }) => `${path} -> ${from}`),
    );
    expect(wrong).toEqual([]);
  });

  it("a file of the program imports nothing of the tests or the scripts", () => {
    const wrong = of("app", "components", "db", "lib", "templates", ...rootFiles).flatMap(({ path, imports }) =>
      imports
        .filter(({ from }) => inside(from, "tests") || inside(from, "scripts"))
        .map(({ from }) => `${path} -> ${from}`),
    );
    expect(wrong).toEqual([]);
  });
});

describe("the pure layers", () => {
  const pure = of("lib/calc", "lib/notify", "templates");
  const forbidden = [
    "next",
    "react",
    "react-dom",
    "drizzle-orm",
    "pg",
    "pg-boss",
    "lucia",
    "nodemailer",
    "@aws-sdk",
    "sharp",
  ];

  it("are there", () => expect(pure.length).toBeGreaterThan(20));

  it("import no framework, database, driver or part of Node", () => {
    const wrong = pure.flatMap(({ path, imports }) =>
      imports
        .filter(({ from }) => from.startsWith("node:") || forbidden.some((name) => isPackage(from, name)))
        .map(({ from }) => `${path} -> ${from}`),
    );
    expect(wrong).toEqual([]);
  });

  it("read no clock, no chance, no network and no environment", () => {
    const impure = (node: ts.Node) =>
      (ts.isNewExpression(node) && node.expression.getText() === "Date" && (node.arguments?.length ?? 0) === 0) ||
      (ts.isCallExpression(node) && node.expression.getText() === "Date") ||
      (ts.isCallExpression(node) && node.expression.getText() === "fetch") ||
      member(node, "Date", "now") ||
      member(node, "Math", "random") ||
      member(node, "performance", "now") ||
      member(node, "crypto", "randomUUID") ||
      member(node, "crypto", "getRandomValues") ||
      (ts.isIdentifier(node) && node.text === "process" && !ts.isPropertyAssignment(node.parent));
    expect(pure.flatMap((source) => namesIn(source, impure))).toEqual([]);
  });
});

describe("side effects", () => {
  it("the database and the session library stay in db/ and lib/server/", () => {
    const packages = ["drizzle-orm", "pg", "pg-boss", "lucia", "@lucia-auth/adapter-drizzle"];
    const wrong = of("app", "components", "lib", "templates", ...rootFiles)
      .filter(({ path }) => !inside(path, "lib/server"))
      .flatMap(({ path, imports }) =>
        imports
          .filter(({ from }) => packages.some((name) => isPackage(from, name)))
          .map(({ from }) => `${path} -> ${from}`),
      );
    expect(wrong).toEqual([]);
  });

  it("the session library is imported by one file", () => {
    const users = sources.filter(({ imports }) => imports.some(({ from }) => /^(lucia|@lucia-auth\/)/.test(from)));
    expect(users.map(({ path }) => path)).toEqual(["lib/server/auth/lucia.ts"]);
  });

  it("process.env is read in db/, lib/server/, scripts, tests and the root's own files only", () => {
    const wrong = of("app", "components", "lib", "templates", "proxy.ts")
      .filter(({ path }) => !inside(path, "lib/server"))
      .flatMap((source) => namesIn(source, (node) => member(node, "process", "env")));
    expect(wrong).toEqual([]);
  });

  it("a client component imports only types from the server's side", () => {
    const client = sources.filter(({ text }) => /^\s*["']use client["']/.test(text));
    const wrong = client.flatMap(({ path, imports }) =>
      imports
        .filter(({ from, typeOnly }) => !typeOnly && (inside(from, "db") || inside(from, "lib/server")))
        .map(({ from }) => `${path} -> ${from}`),
    );
    expect(wrong).toEqual([]);
  });
});

describe("one door each", () => {
  const methods = ["GET", "POST", "PUT", "PATCH", "DELETE"];

  /** Exported constants with the name of the function that made them; anything else exported as "-". */
  const exportsOf = ({ tree }: Source): [name: string, madeBy: string][] =>
    tree.statements.flatMap((statement): [string, string][] => {
      const exported =
        ts.canHaveModifiers(statement) &&
        ts.getModifiers(statement)?.some((one) => one.kind === ts.SyntaxKind.ExportKeyword);
      if (ts.isExportDeclaration(statement)) return statement.isTypeOnly ? [] : [["re-export", "-"]];
      if (!exported || ts.isTypeAliasDeclaration(statement) || ts.isInterfaceDeclaration(statement)) return [];
      if (!ts.isVariableStatement(statement)) return [["a function", "-"]];
      return statement.declarationList.declarations.map((one): [string, string] => {
        const made = one.initializer;
        return [one.name.getText(), made && ts.isCallExpression(made) ? made.expression.getText() : "-"];
      });
    });

  it("every route handler is made by handler() or publicHandler()", () => {
    const wrong = of("app")
      .filter(({ path }) => path.endsWith("/route.ts"))
      .flatMap((source) =>
        exportsOf(source)
          .filter(([name]) => methods.includes(name) || name === "a function" || name === "re-export")
          .filter(([, madeBy]) => madeBy !== "handler" && madeBy !== "publicHandler")
          .map(([name]) => `${source.path} ${name}`),
      );
    expect(wrong).toEqual([]);
  });

  it("only what anybody may read or post to is public", () => {
    const open = of("app")
      .filter(({ path }) => path.endsWith("/route.ts"))
      .flatMap((source) =>
        exportsOf(source)
          .filter(([, madeBy]) => madeBy === "publicHandler")
          .map(([name]) => `${name} ${source.path}`),
      );
    expect(open.sort()).toEqual(["GET app/api/health/route.ts", "GET app/api/v1/schema/job/route.ts"]);
  });

  it("every action is made by viewerAction(); those without a session are named here", () => {
    const withoutSession = ["acceptInvitationAct", "requestResetAct", "resetPasswordAct", "signInAct"];
    const actions = of("app").filter(
      ({ path, text }) => path.endsWith("actions.ts") || /^\s*["']use server["']/.test(text),
    );
    const wrong = actions.flatMap((source) =>
      exportsOf(source)
        .filter(
          ([name, madeBy]) =>
            madeBy !== "viewerAction" && !(madeBy === "publicAction" && withoutSession.includes(name)),
        )
        .map(([name, madeBy]) => `${source.path} ${name} made by ${madeBy}`),
    );
    expect(wrong).toEqual([]);
  });

  it("no action is declared inside a component, where no test would see it", () => {
    const wrong = of("app", "components").filter(
      ({ text, path }) => !path.endsWith("actions.ts") && /["']use server["']/.test(text),
    );
    expect(wrong.map(({ path }) => path)).toEqual([]);
  });
});

describe("files", () => {
  const ours = of("app", "components", "db", "lib", "scripts", "templates").filter(
    ({ path }) => !inside(path, "db/migrations"),
  );

  it("are kebab-case, and none is a drawer for odds and ends", () => {
    const wrong = ours.filter(({ path }) => {
      const parts = path.replace(/\.(ts|tsx|mts|mjs)$/, "").split("/");
      const name = parts.at(-1) ?? "";
      const drawer = parts.some((part) => ["utils", "helpers", "misc", "common"].includes(part));
      return drawer || !/^[a-z0-9]+(-[a-z0-9]+)*(\.module)?$/.test(name);
    });
    expect(wrong.map(({ path }) => path)).toEqual([]);
  });

  it("have at most 400 lines, and half have at most 80", () => {
    const lengths = ours.map(({ path, text }) => ({ path, lines: text.split("\n").length }));
    expect(lengths.filter(({ lines }) => lines > 400)).toEqual([]);
    const sorted = lengths.map(({ lines }) => lines).sort((a, b) => a - b);
    expect(sorted[Math.floor(sorted.length / 2)]).toBeLessThanOrEqual(80);
  });

  it("re-export nothing but the tables, which Drizzle needs in one module", () => {
    const barrels = ours.filter(({ path, tree }) => {
      const all = tree.statements.filter(
        (one) => ts.isExportDeclaration(one) && one.moduleSpecifier && !one.isTypeOnly,
      );
      return path !== "db/schema/index.ts" && all.length > 2 && all.length === tree.statements.length;
    });
    expect(barrels.map(({ path }) => path)).toEqual([]);
  });

  it("hold no left-over: no TODO, no console outside scripts, no ts-ignore", () => {
    const wrong = ours.flatMap(({ path, text }) => {
      const marks = [/\b(TODO|FIXME|XXX)\b/, /@ts-(ignore|nocheck)/, /eslint-disable(?!-next-line)/];
      if (!inside(path, "scripts")) marks.push(/\bconsole\.(log|debug|info)\(/);
      return marks.filter((mark) => mark.test(text)).map((mark) => `${path}: ${mark}`);
    });
    expect(wrong).toEqual([]);
  });
});
