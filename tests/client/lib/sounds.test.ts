import { beforeEach, describe, expect, it, vi } from 'vitest';
import { createSounds, type SoundName } from '../../../src/lib/sounds';

type Tone = { startMs: number; endMs: number; hz: number[]; peak: number };

/** An audio context that plays nothing and writes down what it was given. */
function aRecorder() {
  const tones: Tone[] = [];
  const noises: number[] = [];
  const connectable = <Node extends object>(node: Node): Node & { connect: (next: unknown) => unknown } => ({
    ...node,
    connect: (next: unknown) => next,
  });
  const audio = {
    currentTime: 0,
    sampleRate: 8_000,
    state: 'suspended',
    resume: vi.fn(() => Promise.resolve()),
    destination: {},
    createOscillator() {
      const tone: Tone = { startMs: 0, endMs: 0, hz: [], peak: 0 };
      tones.push(tone);
      return connectable({
        type: 'sine',
        frequency: {
          setValueAtTime: (hz: number) => tone.hz.push(hz),
          exponentialRampToValueAtTime: (hz: number) => tone.hz.push(hz),
        },
        start: (at: number) => (tone.startMs = Math.round(at * 1000)),
        stop: (at: number) => (tone.endMs = Math.round(at * 1000)),
      });
    },
    createGain() {
      const tone = tones.at(-1);
      const note = (value: number) => {
        if (tone) tone.peak = Math.max(tone.peak, value);
      };
      return connectable({ gain: { value: 0, setValueAtTime: note, exponentialRampToValueAtTime: note } });
    },
    createBuffer: (_channels: number, length: number) => {
      noises.push(length);
      return { getChannelData: () => new Float32Array(length) };
    },
    createBufferSource: () => connectable({ buffer: null, start: vi.fn() }),
    createBiquadFilter: () =>
      connectable({
        type: '',
        Q: { value: 0 },
        frequency: { setValueAtTime: vi.fn(), exponentialRampToValueAtTime: vi.fn() },
      }),
  };
  return { audio: audio as unknown as AudioContext, resume: audio.resume, tones, noises };
}

function played(name: SoundName) {
  const recorder = aRecorder();
  createSounds(() => recorder.audio).play(name);
  return recorder;
}

beforeEach(() => {
  localStorage.clear();
});

describe('the sounds', () => {
  it('of a package taken is one tap of 70 ms', () => {
    const { tones } = played('taken');
    expect(tones.map(({ startMs, endMs }) => [startMs, endMs])).toEqual([[0, 70]]);
  });

  it('of a package taken, but look, is a tap and a lower one', () => {
    const [first, second, ...rest] = played('taken-but-look').tones;
    expect(rest).toEqual([]);
    expect(second?.hz[0]).toBeLessThan(first?.hz[0] ?? 0);
  });

  it('of a package not taken is two equal low notes of 120 ms, louder than a tap', () => {
    const [first, second, ...rest] = played('not-taken').tones;
    const [tap] = played('taken').tones;
    expect(rest).toEqual([]);
    expect(first?.hz).toEqual(second?.hz);
    expect((first?.endMs ?? 0) - (first?.startMs ?? 0)).toBe(120);
    expect(first?.peak).toBeGreaterThan(tap?.peak ?? 1);
  });

  it('of a wrong place rises, then falls', () => {
    const [rise, fall] = played('wrong-place').tones;
    expect(rise?.hz[1]).toBeGreaterThan(rise?.hz[0] ?? 0);
    expect(fall?.hz[1]).toBeLessThan(fall?.hz[0] ?? 0);
  });

  it('of a full holder is three taps', () => {
    expect(played('holder-full').tones).toHaveLength(3);
  });

  it('of a load released is 400 ms of brush', () => {
    const { noises, tones } = played('released');
    expect(noises).toEqual([3_200]);
    expect(tones).toEqual([]);
  });

  it('wake the audio that browsers keep asleep until the first key', () => {
    expect(played('taken').resume).toHaveBeenCalled();
  });
});

describe('the switch', () => {
  it('silences, and is remembered at this station', () => {
    const recorder = aRecorder();
    const sounds = createSounds(() => recorder.audio);
    expect(sounds.isOn.get()).toBe(true);
    sounds.setOn(false);
    sounds.play('taken');
    expect(recorder.tones).toEqual([]);
    expect(createSounds(() => recorder.audio).isOn.get()).toBe(false);
    sounds.setOn(true);
    expect(createSounds(() => recorder.audio).isOn.get()).toBe(true);
  });

  it('does no harm in a browser without audio', () => {
    expect(() => {
      createSounds(() => null).play('not-taken');
    }).not.toThrow();
  });
});
