/** A tab that waits for a file. Opened while the press is still fresh: browsers open none for a reply that comes later. */
export type FileTab = {
  readonly show: (address: string) => void;
  readonly giveUp: () => void;
};

/** Opens the tab. Where the browser refuses, the link on the screen remains. */
export function openFileTab(): FileTab {
  const tab = window.open('', '_blank');
  return {
    show(address) {
      tab?.location.replace(new URL(address, window.location.href).href);
    },
    giveUp() {
      tab?.close();
    },
  };
}
