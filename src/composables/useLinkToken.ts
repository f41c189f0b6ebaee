import { ref, watch, type Ref } from 'vue';
import { useRoute, useRouter } from 'vue-router';

/**
 * The token of a link that was mailed. It stands behind the #, which no server sees; taken out of the address at once,
 * so that it is neither sent on nor left in the history.
 */
export function useLinkToken(): Ref<string | null> {
  const route = useRoute();
  const router = useRouter();
  const token = ref<string | null>(null);
  watch(
    () => route.hash,
    (hash) => {
      if (!hash) return;
      token.value = hash.slice(1);
      void router.replace({ path: route.path, query: route.query });
    },
    { immediate: true },
  );
  return token;
}
