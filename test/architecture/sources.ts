import { readdirSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'
import ts from 'typescript'

const ROOT = new URL('../..', import.meta.url).pathname

export interface SourceFile {
  /** From the project's folder: `app/time/zone.ts`. */
  readonly path: string
  readonly text: string
  readonly lines: readonly string[]
}

/** Every file of TypeScript or JavaScript in the named files and folders. */
export function sources(places: readonly string[]): SourceFile[] {
  return places.flatMap(filesOf).map(path => {
    const text = readFileSync(join(ROOT, path), 'utf8')
    return { path, text, lines: text.trimEnd().split('\n') }
  })
}

function filesOf(place: string): string[] {
  if (statSync(join(ROOT, place)).isFile()) return [place]
  return readdirSync(join(ROOT, place), { recursive: true, withFileTypes: true })
    .filter(entry => entry.isFile() && /\.(tsx?|mjs|cjs)$/.test(entry.name))
    .map(entry => join(entry.parentPath, entry.name).slice(ROOT.length))
    .sort()
}

/** True for tests and for what only tests use. */
export function isTest({ path }: { path: string }): boolean {
  return path.startsWith('test/') || /\.test\.tsx?$|\/make\.ts$/.test(path)
}

/** Where a pattern occurs outside comments: `path:line: text`. */
export function linesMatching(files: readonly SourceFile[], pattern: RegExp): string[] {
  return files.flatMap(({ path, lines }) =>
    lines.flatMap((line, index) =>
      pattern.test(line) && !/^\s*(\/\/|\/?\*)/.test(line) ? [`${path}:${index + 1}: ${line.trim()}`] : [],
    ),
  )
}

/** The functions of a file that have a name, with the length of each in lines. */
export function functionsOf(file: SourceFile): { path: string; name: string; lines: number }[] {
  const parsed = parse(file)
  const found: { path: string; name: string; lines: number }[] = []
  const visit = (node: ts.Node) => {
    const name = nameOfFunction(node)
    if (name) {
      const [first, last] = [node.getStart(parsed), node.getEnd()].map(
        at => parsed.getLineAndCharacterOfPosition(at).line,
      )
      found.push({ path: file.path, name, lines: (last ?? 0) - (first ?? 0) + 1 })
    }
    ts.forEachChild(node, visit)
  }
  visit(parsed)
  return found
}

function nameOfFunction(node: ts.Node) {
  if (ts.isFunctionDeclaration(node) || ts.isMethodDeclaration(node)) return node.name?.getText() ?? 'default'
  const isNamed = ts.isVariableDeclaration(node) && node.initializer && ts.isArrowFunction(node.initializer)
  return isNamed ? node.name.getText() : null
}

/** The exported functions and classes of a file that no comment stands above. */
export function undocumented(file: SourceFile): string[] {
  const parsed = parse(file)
  return parsed.statements
    .filter(statement => ts.canHaveModifiers(statement) && isExported(statement) && isFunctionOrClass(statement))
    .filter(statement => ts.getJSDocCommentsAndTags(statement).length === 0)
    .map(statement => {
      const { line } = parsed.getLineAndCharacterOfPosition(statement.getStart(parsed))
      return `${file.path}:${line + 1}: ${file.lines[line]}`
    })
}

function isFunctionOrClass(node: ts.Node) {
  if (!ts.isVariableStatement(node)) return ts.isFunctionDeclaration(node) || ts.isClassDeclaration(node)
  return node.declarationList.declarations.some(({ initializer }) => initializer && ts.isArrowFunction(initializer))
}

function isExported(node: ts.Node & ts.HasModifiers) {
  return ts.getModifiers(node)?.some(({ kind }) => kind === ts.SyntaxKind.ExportKeyword) ?? false
}

function parse({ path, text }: SourceFile) {
  return ts.createSourceFile(path, text, ts.ScriptTarget.Latest, true)
}
