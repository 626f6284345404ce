import * as contract from '../../../contract/tasks'
import { tenantRoute, type Route } from '../../http/route'
import { takeOverTasksOf } from './tasks.takeover.service'
import {
  archiveTaskOf,
  changeTaskOf,
  enterTask,
  listOfTasks,
  readTaskOf,
  restoreTaskOf,
} from './tasks.service'

export const tasksRoutes: Route[] = [
  tenantRoute(contract.listTasks, ({ tenant, query }) => listOfTasks(tenant, query)),
  tenantRoute(contract.createTask, ({ tenant, body }) => enterTask(tenant, body)),
  tenantRoute(contract.takeOverTasks, ({ tenant, params }) => takeOverTasksOf(tenant, params.partId)),
  tenantRoute(contract.readTask, ({ tenant, params }) => readTaskOf(tenant, params.taskId)),
  tenantRoute(contract.changeTask, ({ tenant, params, body }) => changeTaskOf(tenant, params.taskId, body)),
  tenantRoute(contract.archiveTask, ({ tenant, params, body }) =>
    archiveTaskOf(tenant, params.taskId, body.expectedVersion),
  ),
  tenantRoute(contract.restoreTask, ({ tenant, params, body }) =>
    restoreTaskOf(tenant, params.taskId, body.expectedVersion),
  ),
]
