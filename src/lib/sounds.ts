import { createContext, use } from 'react';
import { createStore, useStore, type Store } from './store';

/** Never the only sign of anything: each goes with words and a mark. */
export type SoundName =
  | 'taken'
  | 'taken-but-look'
  | 'holder-full'
  | 'already-here'
  | 'not-taken'
  | 'not-known'
  | 'held'
  | 'called-back'
  | 'place-set'
  | 'wrong-place'
  | 'released';

export type Sounds = {
  readonly play: (name: SoundName) => void;
  readonly isOn: Store<boolean>;
  readonly setOn: (isOn: boolean) => void;
};

const switchKey = 'paperside.sound';

type Note = {
  readonly atMs: number;
  readonly forMs: number;
  readonly fromHz: number;
  readonly toHz: number;
  readonly loudness: number;
  readonly wave: OscillatorType;
};

/** A knuckle on wood: a short falling tone that dies at once. */
const tap = (atMs: number, hz: number): Note => ({
  atMs,
  forMs: 70,
  fromHz: hz,
  toHz: hz * 0.72,
  loudness: 0.32,
  wave: 'triangle',
});

const low = (atMs: number): Note => ({ atMs, forMs: 120, fromHz: 196, toHz: 196, loudness: 0.5, wave: 'square' });

const glide = (atMs: number, fromHz: number, toHz: number): Note => ({
  atMs,
  forMs: 150,
  fromHz,
  toHz,
  loudness: 0.34,
  wave: 'sine',
});

const scores: Readonly<Record<Exclude<SoundName, 'released'>, readonly Note[]>> = {
  taken: [tap(0, 760)],
  'taken-but-look': [tap(0, 760), tap(130, 480)],
  // Flat and double: nothing new.
  'already-here': [tap(0, 520), tap(110, 520)],
  'not-taken': [low(0), low(170)],
  // Rising, as a question does.
  'not-known': [glide(0, 300, 560)],
  held: [low(0), low(170), low(340)],
  // Falling away, three times: the one to stop for.
  'called-back': [glide(0, 620, 200), glide(190, 620, 200), glide(380, 620, 200)],
  'place-set': [tap(0, 1040)],
  'wrong-place': [glide(0, 360, 620), glide(160, 620, 300)],
  'holder-full': [tap(0, 760), tap(95, 760), tap(190, 760)],
};

function playNote(audio: AudioContext, note: Note) {
  const start = audio.currentTime + note.atMs / 1000;
  const end = start + note.forMs / 1000;
  const tone = audio.createOscillator();
  const loudness = audio.createGain();
  tone.type = note.wave;
  tone.frequency.setValueAtTime(note.fromHz, start);
  tone.frequency.exponentialRampToValueAtTime(note.toHz, end);
  loudness.gain.setValueAtTime(0.0001, start);
  loudness.gain.exponentialRampToValueAtTime(note.loudness, start + 0.004);
  loudness.gain.exponentialRampToValueAtTime(0.0001, end);
  tone.connect(loudness).connect(audio.destination);
  tone.start(start);
  tone.stop(end);
}

/** A zip drawn shut: ribbed noise that brushes upward for 400 ms. */
function playZip(audio: AudioContext) {
  const seconds = 0.4;
  const ribs = 34;
  const noise = audio.createBuffer(1, Math.ceil(audio.sampleRate * seconds), audio.sampleRate);
  const samples = noise.getChannelData(0);
  for (let at = 0; at < samples.length; at += 1) {
    const along = at / samples.length;
    const rib = 0.35 + 0.65 * Math.abs(Math.sin(Math.PI * ribs * along));
    samples[at] = (Math.random() * 2 - 1) * rib * Math.sin(Math.PI * along);
  }
  const source = audio.createBufferSource();
  const band = audio.createBiquadFilter();
  const loudness = audio.createGain();
  source.buffer = noise;
  band.type = 'bandpass';
  band.Q.value = 1.4;
  band.frequency.setValueAtTime(900, audio.currentTime);
  band.frequency.exponentialRampToValueAtTime(5200, audio.currentTime + seconds);
  loudness.gain.value = 0.5;
  source.connect(band).connect(loudness).connect(audio.destination);
  source.start();
}

function readSwitch(): boolean {
  try {
    return localStorage.getItem(switchKey) !== 'off';
  } catch {
    return true;
  }
}

/** The sounds, made by the tablet itself: nothing is fetched. Silent where the browser has no Web Audio. */
export function createSounds(makeAudio: () => AudioContext | null = browserAudio): Sounds {
  const isOn = createStore(readSwitch());
  let audio: AudioContext | null | undefined;

  return {
    isOn,
    setOn(next) {
      isOn.set(next);
      try {
        localStorage.setItem(switchKey, next ? 'on' : 'off');
      } catch {
        // A browser without storage forgets the switch at the next visit; that is all.
      }
    },
    play(name) {
      if (!isOn.get()) return;
      audio ??= makeAudio();
      if (audio === null) return;
      // Browsers keep it asleep until the first touch or key of a person; a scan counts as a key.
      if (audio.state === 'suspended') void audio.resume();
      if (name === 'released') playZip(audio);
      else for (const note of scores[name]) playNote(audio, note);
    },
  };
}

function browserAudio(): AudioContext | null {
  return typeof AudioContext === 'undefined' ? null : new AudioContext({ latencyHint: 'interactive' });
}

export const SoundsContext = createContext<Sounds | null>(null);

export function useSounds(): Sounds {
  const sounds = use(SoundsContext);
  if (sounds === null) throw new Error('useSounds needs a SoundsContext above it');
  return sounds;
}

export function useSoundSwitch(): { isOn: boolean; setOn: (isOn: boolean) => void } {
  const sounds = useSounds();
  return { isOn: useStore(sounds.isOn), setOn: sounds.setOn };
}
