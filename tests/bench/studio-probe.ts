/** What the probe notes of a page: times in milliseconds of the page's clock; 0 is not yet. */
export interface Noted {
  /** Start of the page's clock, in milliseconds since 1970. */
  readonly origin: number;
  /** When the latest run was asked for. */
  asked: number;
  answered: number;
  /** When the new light was handed to the picture's worker, and when that had drawn it. */
  sent: number;
  painted: number;
  /** The latest key, and the script it set going in its turn. */
  key: number;
  keyMs: number;
  /** Script of each animation frame. */
  frames: number[];
  /** Pictures that were drawn. */
  pictures: number;
}

const noted: Noted = {
  origin: performance.timeOrigin,
  asked: 0,
  answered: 0,
  sent: 0,
  painted: 0,
  key: 0,
  keyMs: 0,
  frames: [],
  pictures: 0,
};
Object.assign(window, { noted });

/** Calls back when this turn of the page, and what it drew, is over. */
function afterTurn(run: () => void): void {
  const channel = new MessageChannel();
  channel.port1.onmessage = run;
  channel.port2.postMessage(null);
}

/** A call to a worker as it goes over: the name of what is called, or the kind of a message. */
interface Posted {
  readonly path?: readonly string[];
  readonly kind?: string;
}

const NativeWorker = window.Worker;
window.Worker = class extends NativeWorker {
  constructor(url: string | URL, options?: WorkerOptions) {
    super(url, options);
    // The first to listen, so that an answer is noted before anybody acts on it.
    this.addEventListener("message", () => this.#waiting.splice(0).forEach((hear) => hear()));
    const post = this.postMessage.bind(this);
    this.postMessage = (message: Posted, ...rest: [never]) => {
      const called = message.path?.[0] ?? message.kind;
      if (called === "prepare") {
        noted.asked = performance.now();
        noted.answered = noted.sent = noted.painted = 0;
      }
      if (called === "finish") this.#onAnswer(() => (noted.answered = performance.now()));
      if (called === "draw") {
        const isNew = noted.answered !== 0 && noted.sent === 0;
        if (isNew) noted.sent = performance.now();
        this.#onAnswer(() => {
          noted.pictures += 1;
          if (isNew) noted.painted = performance.now();
        });
      }
      post(message, ...rest);
    };
  }

  #waiting: (() => void)[] = [];

  #onAnswer(hear: () => void): void {
    this.#waiting.push(hear);
  }
};

addEventListener(
  "keydown",
  () => {
    noted.key = performance.now();
    afterTurn(() => (noted.keyMs = performance.now() - noted.key));
  },
  true,
);

const request = window.requestAnimationFrame.bind(window);
let frameAt = 0;
window.requestAnimationFrame = (run) =>
  request((at) => {
    const start = performance.now();
    run(at);
    const spent = performance.now() - start;
    if (at === frameAt) noted.frames.push((noted.frames.pop() ?? 0) + spent);
    else noted.frames.push(spent);
    frameAt = at;
  });
