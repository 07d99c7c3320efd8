/** Says which time zone and locale a worker lives in. */
const { timeZone, locale } = Intl.DateTimeFormat().resolvedOptions();
self.postMessage({ timeZone, locale });
