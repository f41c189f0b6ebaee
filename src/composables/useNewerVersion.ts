import { onMounted, ref, type Ref } from 'vue';

/** Once an hour, for pages that stay open through an evening. */
const LOOK_MS = 3_600_000;

/**
 * Keeps the pages that work without a network, and tells when a newer version of them has come. It takes the place of
 * the one at work only when the reader says so, so that nothing changes under their hands.
 */
export function useNewerVersion(): { readonly isReady: Ref<boolean>; readonly takeOver: () => void } {
  const isReady = ref(false);
  let waiting: ServiceWorker | null = null;

  function note(worker: ServiceWorker | null): void {
    // Without a controller it is the first one, which replaces nothing.
    if (!worker || !navigator.serviceWorker.controller) return;
    waiting = worker;
    isReady.value = true;
  }

  function watchInstalling({ installing }: ServiceWorkerRegistration): void {
    installing?.addEventListener('statechange', () => {
      if (installing.state === 'installed') note(installing);
    });
  }

  async function register(): Promise<void> {
    const registration = await navigator.serviceWorker.register('/offline.js', { updateViaCache: 'none' });
    note(registration.waiting);
    watchInstalling(registration);
    registration.addEventListener('updatefound', () => watchInstalling(registration));
    setInterval(() => void registration.update().catch(() => undefined), LOOK_MS);
  }

  function takeOver(): void {
    navigator.serviceWorker.addEventListener('controllerchange', () => location.reload(), { once: true });
    waiting?.postMessage('take over');
  }

  onMounted(() => {
    // Only built clients have the worker; those that tests build are no PROD by their environment.
    if (import.meta.env.MODE !== 'production' || !('serviceWorker' in navigator)) return;
    // After everything that the page itself needs; that it can't be kept is no trouble.
    const begin = () => void register().catch(() => undefined);
    if (document.readyState === 'complete') begin();
    else addEventListener('load', begin, { once: true });
  });

  return { isReady, takeOver };
}
