// The client's side of the protocol, the same wherever the server runs.
import * as vscode from 'vscode';
import { type BaseLanguageClient, type LanguageClientOptions, RevealOutputChannelOn } from 'vscode-languageclient';
import { THEME_NOTIFICATION, type Theme } from '../server/theme.ts';

export const CLIENT_ID = 'tautline';
export const CLIENT_NAME = 'Tautline';

export function clientOptions(): LanguageClientOptions {
  return {
    documentSelector: [{ language: 'markdown' }],
    synchronize: { configurationSection: 'tautline' },
    initializationOptions: { theme: currentTheme() },
    revealOutputChannelOn: RevealOutputChannelOn.Never,
  };
}

/** Tells the server when the editor turns light or dark. */
export function followTheme(client: BaseLanguageClient, context: vscode.ExtensionContext): void {
  context.subscriptions.push(
    vscode.window.onDidChangeActiveColorTheme(() => {
      void client.sendNotification(THEME_NOTIFICATION, { theme: currentTheme() });
    }),
  );
}

function currentTheme(): Theme {
  const { kind } = vscode.window.activeColorTheme;
  return kind === vscode.ColorThemeKind.Dark || kind === vscode.ColorThemeKind.HighContrast ? 'dark' : 'light';
}
