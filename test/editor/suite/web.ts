// Entry of the suite in the web worker that is the extension host of VS Code for the Web. The results go to the server
// that the workbench came from; its address is put in by the driver.
import { results } from './results.ts';

declare const RESULTS_ADDRESS: string;

export async function run(): Promise<void> {
  await fetch(RESULTS_ADDRESS, { method: 'POST', body: JSON.stringify(await results()) });
}
