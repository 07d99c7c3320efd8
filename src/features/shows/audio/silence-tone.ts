/** Tone writes its version to the console when it loads, unless it finds this. Import before Tone. */
Object.assign(globalThis, { TONE_SILENCE_LOGGING: true });
