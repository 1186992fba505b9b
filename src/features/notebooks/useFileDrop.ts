import { useEffect, useState } from "react";

/** Takes a file dropped anywhere on the page; answers whether one is held over it. */
export function useFileDrop(onFile: (file: File) => void): boolean {
  const [isOver, setOver] = useState(false);

  useEffect(
    function listenForFiles() {
      const carriesFile = (event: DragEvent): boolean => event.dataTransfer?.types.includes("Files") ?? false;
      const handleOver = (event: DragEvent): void => {
        if (!carriesFile(event)) return;
        event.preventDefault();
        setOver(true);
      };
      const handleLeave = (event: DragEvent): void => {
        if (event.relatedTarget === null) setOver(false);
      };
      const handleDrop = (event: DragEvent): void => {
        setOver(false);
        // A drop that a part of the page has taken is not taken twice.
        if (!carriesFile(event) || event.defaultPrevented) return;
        event.preventDefault();
        const file = event.dataTransfer?.files[0];
        if (file) onFile(file);
      };
      document.addEventListener("dragover", handleOver);
      document.addEventListener("dragleave", handleLeave);
      document.addEventListener("drop", handleDrop);
      return () => {
        document.removeEventListener("dragover", handleOver);
        document.removeEventListener("dragleave", handleLeave);
        document.removeEventListener("drop", handleDrop);
      };
    },
    [onFile],
  );

  return isOver;
}
