// The settings, in one table: the manifest declares the same, and a test holds the two together.

export interface Settings {
  readonly valuesInText: boolean;
  readonly drawingsInHovers: boolean;
}

export const SETTINGS: {
  readonly [K in keyof Settings]: { readonly default: Settings[K]; readonly description: string };
} = {
  valuesInText: { default: true, description: 'Show results and values beside the text of a note.' },
  drawingsInHovers: { default: true, description: 'Show a small drawing when the pointer rests on a member.' },
};

export const DEFAULT_SETTINGS: Settings = {
  valuesInText: SETTINGS.valuesInText.default,
  drawingsInHovers: SETTINGS.drawingsInHovers.default,
};

/** What a client sent, of which only what has the right kind is taken. */
export function readSettings(sent: unknown): Settings {
  const given = typeof sent === 'object' && sent !== null ? sent : {};
  const pick = (name: keyof Settings): boolean => {
    const value: unknown = Reflect.get(given, name);
    return typeof value === 'boolean' ? value : DEFAULT_SETTINGS[name];
  };
  return { valuesInText: pick('valuesInText'), drawingsInHovers: pick('drawingsInHovers') };
}
