import { useId, useState } from "react";

interface FileDropProps {
  file: File | null;
  onFile: (file: File) => void;
}

/** A place to drop one file on, or to choose it from. */
export function FileDrop({ file, onFile }: FileDropProps) {
  const id = useId();
  const [isOver, setOver] = useState(false);

  function handleDrop(event: React.DragEvent) {
    event.preventDefault();
    setOver(false);
    const [dropped] = event.dataTransfer.files;
    if (dropped) onFile(dropped);
  }

  return (
    <label
      htmlFor={id}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={handleDrop}
      className={`flex cursor-pointer flex-wrap items-baseline gap-x-12 gap-y-4 border border-dashed px-18 py-18 font-sans text-[14.5px]/[22px] transition-colors focus-within:outline-2 focus-within:outline-offset-3 focus-within:outline-dusk ${isOver ? "border-dusk bg-dusk-wash" : "border-rule2 bg-sunk"}`}
    >
      <input
        id={id}
        type="file"
        accept=".md,.markdown,text/markdown,text/plain"
        className="visually-hidden"
        onChange={(event) => {
          const [chosen] = event.target.files ?? [];
          if (chosen) onFile(chosen);
          event.target.value = "";
        }}
      />
      {file ? (
        <>
          <span className="min-w-0 truncate font-semibold">{file.name}</span>
          <span className="text-dusk">choose another</span>
        </>
      ) : (
        <span>
          Drop a file here, or <span className="font-medium text-dusk">choose one</span>
        </span>
      )}
    </label>
  );
}
