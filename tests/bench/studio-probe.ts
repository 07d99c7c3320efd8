/** What the probe notes of a page: times in milliseconds of the page's clock; 0 is not yet. */
export interface Noted {
  /** When the latest run was asked for, and what asking cost. */
  asked: number;
  askMs: number;
  answered: number;
  painted: number;
  /** The latest key, and the script it set going in its turn. */
  key: number;
  keyMs: number;
  /** Script of each animation frame. */
  frames: number[];
}

const noted: Noted = { asked: 0, askMs: 0, answered: 0, painted: 0, key: 0, keyMs: 0, frames: [] };
Object.assign(window, { noted });

/** Calls back when this turn of the page, and what it drew, is over. */
function afterTurn(run: () => void): void {
  const channel = new MessageChannel();
  channel.port1.onmessage = run;
  channel.port2.postMessage(null);
}

const NativeWorker = window.Worker;
window.Worker = class extends NativeWorker {
  constructor(url: string | URL, options?: WorkerOptions) {
    super(url, options);
    if (options?.name !== "run") return;
    const post = this.postMessage.bind(this);
    this.postMessage = (message: { path?: string[] }, ...rest: [never]) => {
      const start = performance.now();
      post(message, ...rest);
      if (message.path?.[0] !== "run") return;
      noted.askMs = performance.now() - start;
      noted.asked = performance.now();
      noted.answered = noted.painted = 0;
      const handleAnswer = () => {
        noted.answered = performance.now();
        this.removeEventListener("message", handleAnswer);
      };
      this.addEventListener("message", handleAnswer);
    };
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

const draw = CanvasRenderingContext2D.prototype.drawImage as (...all: unknown[]) => void;
CanvasRenderingContext2D.prototype.drawImage = function (this: CanvasRenderingContext2D, ...all: unknown[]) {
  draw.apply(this, all);
  if (noted.answered === 0 || noted.painted !== 0 || !this.canvas.isConnected) return;
  noted.painted = -1;
  afterTurn(() => (noted.painted = performance.now()));
};

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
