// Runs one Python script in the browser's own Python, here on the building machine.
//
//   node bytecode.mjs <folder of pyodide.mjs> <script.py> <folder seen as /stage>
//
// -OO drops docstrings and asserts; no_debug_ranges keeps line numbers but drops columns. A fixed
// hash seed makes sets, and so the byte code, the same each time.
import { readFileSync } from "node:fs";
import { pathToFileURL } from "node:url";

const [runtime, script, stage] = process.argv.slice(2);
const { loadPyodide } = await import(pathToFileURL(`${runtime}/pyodide.mjs`));
const pyodide = await loadPyodide({
  indexURL: `${runtime}/`,
  args: ["-OO", "-X", "no_debug_ranges"],
  env: { PYTHONHASHSEED: "0" },
});
pyodide.FS.mkdirTree("/stage");
pyodide.FS.mount(pyodide.FS.filesystems.NODEFS, { root: stage }, "/stage");
try {
  pyodide.runPython(readFileSync(script, "utf8"));
} catch (error) {
  // The first and last lines name the error; what lies between can be a megabyte.
  const lines = String(error).trim().split("\n");
  console.error(lines.at(-1).slice(0, 400));
  process.exit(1);
}
