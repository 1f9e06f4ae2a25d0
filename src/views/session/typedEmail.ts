import { ref } from 'vue'

/** The address as it was typed last, so that going from sign-in to *Forgotten password* and back loses nothing. */
export const typedEmail = ref('')
