const DAY_MS = 86_400_000;

/** "640 KB", "12.4 MB": decimal units (1 MB is 1,000,000 bytes), as disks are sold. */
export function presentBytes(bytes: number): string {
  const units = ["bytes", "KB", "MB", "GB", "TB"];
  const power = bytes < 1000 ? 0 : Math.min(Math.floor(Math.log10(bytes) / 3), units.length - 1);
  const value = bytes / 1000 ** power;
  return `${power === 0 || value >= 100 ? Math.round(value) : Math.round(value * 10) / 10} ${units[power]}`;
}

/** Whether a day has passed since the last backup, or there is none. */
export function isBackupOld(lastBackupAt: number | null, now: number): boolean {
  return lastBackupAt === null || now - lastBackupAt > DAY_MS;
}
