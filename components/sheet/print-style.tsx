/** A sheet is printed across the paper, on A4 or A3 alike. */
export const PrintStyle = () => <style>{'@page { size: landscape }'}</style>
