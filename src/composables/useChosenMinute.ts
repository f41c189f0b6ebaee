import { computed, onBeforeUnmount, onMounted, ref } from 'vue';
import { clock } from './clock';

const SECOND_MS = 1000;
const MINUTE_MS = 60_000;

/** The minute that is looked at: one that was chosen, or the running clock's while it is followed. */
export function useChosenMinute(span: () => readonly [fromMs: number, toMs: number]) {
  const nowMs = ref(clock.now().getTime());
  const pickedMs = ref<number | null>(null);
  const isLive = ref(false);
  let timer: ReturnType<typeof setInterval> | undefined;

  onMounted(() => (timer = setInterval(() => (nowMs.value = clock.now().getTime()), SECOND_MS)));
  onBeforeUnmount(() => clearInterval(timer));

  const chosenMs = computed(() => {
    if (isLive.value) return nowMs.value;
    const [fromMs, toMs] = span();
    return Math.min(toMs, Math.max(fromMs, pickedMs.value ?? fromMs));
  });
  const isNowInside = computed(() => nowMs.value >= span()[0] && nowMs.value <= span()[1]);
  const minutes = computed(() => Math.max(1, Math.floor((span()[1] - span()[0]) / MINUTE_MS)));
  const place = computed(() => {
    const at = Math.round((chosenMs.value - span()[0]) / MINUTE_MS);
    return Math.min(minutes.value, Math.max(0, at));
  });

  function pick(minute: number): void {
    isLive.value = false;
    pickedMs.value = span()[0] + minute * MINUTE_MS;
  }

  function follow(isWished: boolean): void {
    pickedMs.value = chosenMs.value;
    isLive.value = isWished;
  }

  return { chosenMs, isLive, isNowInside, minutes, place, pick, follow };
}
