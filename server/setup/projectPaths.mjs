import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** Where the project lies, whatever folder the command was called from. */
export const projectRoot = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');

/** @param {...string} parts below the project's folder */
export const inProject = (...parts) => path.join(projectRoot, ...parts);

/** The program that a package puts into node_modules/.bin. @param {string} name */
export const packageProgram = (name) => inProject('node_modules', '.bin', name);
