import * as contract from '../../../contract/characteristics'
import { tenantRoute, type Route } from '../../http/route'
import {
  archiveCharacteristicOf,
  changeCharacteristicOf,
  characteristicById,
  confirmCharacteristicOf,
  enterCharacteristic,
  listOfCharacteristics,
  restoreCharacteristicOf,
} from './characteristics.service'

export const characteristicsRoutes: Route[] = [
  tenantRoute(contract.listCharacteristics, ({ tenant, query }) => listOfCharacteristics(tenant, query)),
  tenantRoute(contract.createCharacteristic, ({ tenant, params, body }) =>
    enterCharacteristic(tenant, params, body),
  ),
  tenantRoute(contract.readCharacteristic, ({ tenant, params }) =>
    characteristicById(tenant, params.characteristicId),
  ),
  tenantRoute(contract.changeCharacteristic, ({ tenant, params, body }) =>
    changeCharacteristicOf(tenant, params.characteristicId, body),
  ),
  tenantRoute(contract.confirmCharacteristic, ({ tenant, params, body }) =>
    confirmCharacteristicOf(tenant, params.characteristicId, body.expectedVersion),
  ),
  tenantRoute(contract.archiveCharacteristic, ({ tenant, params, body }) =>
    archiveCharacteristicOf(tenant, params.characteristicId, body.expectedVersion),
  ),
  tenantRoute(contract.restoreCharacteristic, ({ tenant, params, body }) =>
    restoreCharacteristicOf(tenant, params.characteristicId, body.expectedVersion),
  ),
]
