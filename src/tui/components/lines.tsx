/** Lines that are already drawn, as one element: they have their final width and style. */
import { Text } from 'ink';
import { memo } from 'react';

export const Lines = memo(function Lines({ text }: { readonly text: string }) {
  return <Text>{text}</Text>;
});
