// Loaded with `node --import` before the project's own commands, which are TypeScript files.
import "tsx";
import { register } from "node:module";

register("./server-only.mjs", import.meta.url);
