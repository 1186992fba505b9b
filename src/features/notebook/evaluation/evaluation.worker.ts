import { expose } from "comlink";
import { createEvaluationService } from "./evaluationService";

expose(createEvaluationService());
