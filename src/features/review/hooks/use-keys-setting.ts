import { useState } from 'react';

const storageKey = 'slackwater.single-keys';

/** Whether single keys do things; remembered on this device. */
export function useKeysSetting(): [boolean, (on: boolean) => void] {
  const [isOn, setIsOn] = useState(() => readSetting());
  return [
    isOn,
    (on) => {
      setIsOn(on);
      try {
        window.localStorage.setItem(storageKey, on ? 'on' : 'off');
      } catch {
        // Storage switched off: the choice holds until the screen is left.
      }
    },
  ];
}

function readSetting(): boolean {
  try {
    return window.localStorage.getItem(storageKey) !== 'off';
  } catch {
    return true;
  }
}
