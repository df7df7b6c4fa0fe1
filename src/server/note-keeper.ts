// Keeps the open notes: each version of a text is evaluated once, whoever asks first, and its diagnostics are sent as
// soon as the writer can use them.
import { type Diagnostic, DiagnosticSeverity } from 'vscode-languageserver';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import { mayHoldCalculation } from '../note/calculation-mark.ts';
import { createMemory, evaluateNote } from '../note/evaluate.ts';
import type { Memory } from '../note/memory.ts';
import { diagnosticsOf } from './diagnostics.ts';
import type { OpenNote } from './open-note.ts';

type Send = (uri: string, version: number, diagnostics: Diagnostic[]) => void;

interface Kept {
  readonly memory: Memory;
  version: number;
  note: OpenNote | undefined;
  /** How long the last evaluation took, ms. */
  duration: number;
  timer: ReturnType<typeof setTimeout> | undefined;
  /** Whether the editor shows diagnostics of ours for this text. */
  reported: boolean;
  /** Whether the program itself failed on this version. */
  failed: boolean;
}

/** An evaluation that is over within one frame of the screen answers each keystroke; a longer one waits for a pause. */
const AT_ONCE = 16;
const LONGEST_WAIT = 400;

/** No diagnostic of the note: its code is not one of the language's. */
const FAILURE: Diagnostic = {
  range: { start: { line: 0, character: 0 }, end: { line: 0, character: 1 } },
  severity: DiagnosticSeverity.Error,
  source: 'tautline',
  code: 'program-failure',
  message: 'The program failed on this note, which is its own mistake: no figure is shown. Its output has the details.',
};

export class NoteKeeper {
  readonly #kept = new Map<string, Kept>();
  readonly #send: Send;
  readonly #log: (message: string) => void;

  constructor(send: Send, log: (message: string) => void) {
    this.#send = send;
    this.#log = log;
  }

  changed(document: TextDocument): void {
    const kept = this.#keptOf(document.uri);
    clearTimeout(kept.timer);
    if (kept.duration <= AT_ONCE) this.#report(document);
    else kept.timer = setTimeout(() => this.#report(document), Math.min(2 * kept.duration, LONGEST_WAIT));
  }

  closed(uri: string): void {
    const kept = this.#kept.get(uri);
    if (kept === undefined) return;
    clearTimeout(kept.timer);
    if (kept.reported) this.#send(uri, kept.version, []);
    this.#kept.delete(uri);
  }

  /** Undefined for a text that is no note of ours. */
  noteOf(document: TextDocument | undefined): OpenNote | undefined {
    if (document === undefined) return undefined;
    const kept = this.#keptOf(document.uri);
    if (kept.version !== document.version) {
      kept.version = document.version;
      kept.note = this.#evaluate(document, kept);
    }
    return kept.note;
  }

  #keptOf(uri: string): Kept {
    const known = this.#kept.get(uri);
    if (known !== undefined) return known;
    const fresh: Kept = {
      memory: createMemory(),
      version: Number.NaN,
      note: undefined,
      duration: 0,
      timer: undefined,
      reported: false,
      failed: false,
    };
    this.#kept.set(uri, fresh);
    return fresh;
  }

  /** A text without a fence gets no diagnostics, and none are sent for it unless there were some before. */
  #report(document: TextDocument): void {
    const note = this.noteOf(document);
    const kept = this.#keptOf(document.uri);
    const diagnostics = note === undefined ? (kept.failed ? [FAILURE] : []) : diagnosticsOf(note);
    if (note === undefined && !kept.failed && !kept.reported) return;
    kept.reported = note !== undefined || kept.failed;
    this.#send(document.uri, document.version, diagnostics);
  }

  /** A throw is a mistake in the program: it is logged and told, and costs the figures of this version of the note only. */
  #evaluate(document: TextDocument, kept: Kept): OpenNote | undefined {
    kept.failed = false;
    const text = document.getText();
    if (!mayHoldCalculation(text)) return undefined;
    const start = performance.now();
    try {
      const result = evaluateNote(text, { path: fileName(document.uri), memory: kept.memory });
      return result.isCalculation ? { document, result } : undefined;
    } catch (error) {
      this.#log(error instanceof Error ? (error.stack ?? error.message) : String(error));
      kept.failed = true;
      return undefined;
    } finally {
      kept.duration = performance.now() - start;
    }
  }
}

function fileName(uri: string): string {
  const last = uri.slice(uri.lastIndexOf('/') + 1);
  try {
    return decodeURIComponent(last);
  } catch {
    return last;
  }
}
