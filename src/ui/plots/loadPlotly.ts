import Plotly from "plotly.js";
import createPlotlyComponent from "react-plotly.js/factory";

/** The React part bound to the one copy of the figure library; import this module only on demand. */
export const createPlot = createPlotlyComponent(Plotly);

export { Plotly };
