import { expose } from "comlink";
import { createTaskService } from "./taskService";

expose(createTaskService());
