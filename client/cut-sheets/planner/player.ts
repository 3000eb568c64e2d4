export const SPEEDS = [1, 5, 20, 60] as const;
export type Speed = (typeof SPEEDS)[number];

/** The wire's run along the cut. */
export interface Player {
  /** Where it stands, s from the start of the program. */
  readonly seconds: number;
  readonly totalSeconds: number;
  readonly playing: boolean;
  readonly speed: Speed;
}

export type PlayerAction =
  /** Another cut: the wire stays at the same share of it. */
  | { readonly type: 'load'; readonly totalSeconds: number }
  /** Runs or stops; from the end it begins anew. */
  | { readonly type: 'toggle' }
  | { readonly type: 'stop' }
  /** So much time of the clock has passed. */
  | { readonly type: 'tick'; readonly clockSeconds: number }
  /** To a moment; the wire stops there. */
  | { readonly type: 'seek'; readonly seconds: number }
  /** To the next (1) or last (−1) of these moments. */
  | { readonly type: 'step'; readonly by: number; readonly times: ArrayLike<number> }
  | { readonly type: 'speed'; readonly speed: Speed };

export function startPlayer(totalSeconds: number): Player {
  return { seconds: 0, totalSeconds, playing: false, speed: 20 };
}

/** Two moments nearer than this are one, s. */
const SAME = 1e-6;

export function reducePlayer(player: Player, action: PlayerAction): Player {
  const { seconds, totalSeconds } = player;
  const held = (value: number) => Math.min(totalSeconds, Math.max(0, value));
  switch (action.type) {
    case 'load': {
      if (action.totalSeconds === totalSeconds) return player;
      const share = totalSeconds > 0 ? seconds / totalSeconds : 0;
      return { ...player, totalSeconds: action.totalSeconds, seconds: share * action.totalSeconds };
    }
    case 'toggle':
      if (totalSeconds <= 0) return player;
      if (player.playing) return { ...player, playing: false };
      return { ...player, playing: true, seconds: seconds >= totalSeconds ? 0 : seconds };
    case 'stop':
      return player.playing ? { ...player, playing: false } : player;
    case 'tick': {
      if (!player.playing) return player;
      const next = held(seconds + action.clockSeconds * player.speed);
      return { ...player, seconds: next, playing: next < totalSeconds };
    }
    case 'seek':
      return { ...player, playing: false, seconds: held(action.seconds) };
    case 'step':
      return { ...player, playing: false, seconds: held(stepped(seconds, action)) };
    case 'speed':
      return { ...player, speed: action.speed };
  }
}

function stepped(seconds: number, { by, times }: Extract<PlayerAction, { type: 'step' }>): number {
  const all = Array.from(times);
  if (by > 0) return all.filter((time) => time > seconds + SAME)[by - 1] ?? Infinity;
  return all.filter((time) => time < seconds - SAME).at(by) ?? 0;
}
