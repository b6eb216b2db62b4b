export declare const demoHouses: {
    readonly twoFloorsLaundryUp: {
        elevationFt: number | null;
        laundryTrapFt: number | null;
        gaugeFt: number | null;
        highestOutletFt: number | null;
        waterLowestFittingFt: number | null;
        waterPipeMaterials: ("pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel")[];
        waterPipes: {
            material: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel";
            nominalIn: 1 | 2 | 1.25 | 1.5 | 0.375 | 0.5 | 0.75;
            lengthFt: number;
        }[];
        lowestRatedPsi: number | null;
        lowestRatedAirPsi: number | null;
        supplyPsi: number | null;
        floors: {
            name: string;
            elevationFt: number;
        }[];
        lowestFittingFt: number | null;
        highestFittingFt: number | null;
        ventTerminalFt: number | null;
        cappedVents: number;
        atticCutFt: number | null;
        standpipeFt: number | null;
        laundry: {
            floor: string;
            boxOutletFt: number | null;
            branchFt: number | null;
        } | null;
        pipeMaterial: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel" | null;
        plugs: {
            name: string;
            elevationFt: number;
            ratedPsi: number;
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3 | null;
        }[];
        pipes: {
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3;
            material: "pvc-sch40" | "abs-sch40";
            bottomFt: number;
            topFt: number;
            lengthFt: number;
        }[];
    };
    readonly twoFloorsLaundryDown: {
        elevationFt: number | null;
        laundryTrapFt: number | null;
        gaugeFt: number | null;
        highestOutletFt: number | null;
        waterLowestFittingFt: number | null;
        waterPipeMaterials: ("pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel")[];
        waterPipes: {
            material: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel";
            nominalIn: 1 | 2 | 1.25 | 1.5 | 0.375 | 0.5 | 0.75;
            lengthFt: number;
        }[];
        lowestRatedPsi: number | null;
        lowestRatedAirPsi: number | null;
        supplyPsi: number | null;
        floors: {
            name: string;
            elevationFt: number;
        }[];
        lowestFittingFt: number | null;
        highestFittingFt: number | null;
        ventTerminalFt: number | null;
        cappedVents: number;
        atticCutFt: number | null;
        standpipeFt: number | null;
        laundry: {
            floor: string;
            boxOutletFt: number | null;
            branchFt: number | null;
        } | null;
        pipeMaterial: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel" | null;
        plugs: {
            name: string;
            elevationFt: number;
            ratedPsi: number;
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3 | null;
        }[];
        pipes: {
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3;
            material: "pvc-sch40" | "abs-sch40";
            bottomFt: number;
            topFt: number;
            lengthFt: number;
        }[];
    };
    readonly slab: {
        elevationFt: number | null;
        laundryTrapFt: number | null;
        gaugeFt: number | null;
        highestOutletFt: number | null;
        waterLowestFittingFt: number | null;
        waterPipeMaterials: ("pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel")[];
        waterPipes: {
            material: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel";
            nominalIn: 1 | 2 | 1.25 | 1.5 | 0.375 | 0.5 | 0.75;
            lengthFt: number;
        }[];
        lowestRatedPsi: number | null;
        lowestRatedAirPsi: number | null;
        supplyPsi: number | null;
        floors: {
            name: string;
            elevationFt: number;
        }[];
        lowestFittingFt: number | null;
        highestFittingFt: number | null;
        ventTerminalFt: number | null;
        cappedVents: number;
        atticCutFt: number | null;
        standpipeFt: number | null;
        laundry: {
            floor: string;
            boxOutletFt: number | null;
            branchFt: number | null;
        } | null;
        pipeMaterial: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel" | null;
        plugs: {
            name: string;
            elevationFt: number;
            ratedPsi: number;
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3 | null;
        }[];
        pipes: {
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3;
            material: "pvc-sch40" | "abs-sch40";
            bottomFt: number;
            topFt: number;
            lengthFt: number;
        }[];
    };
    readonly crawlSpace: {
        elevationFt: number | null;
        laundryTrapFt: number | null;
        gaugeFt: number | null;
        highestOutletFt: number | null;
        waterLowestFittingFt: number | null;
        waterPipeMaterials: ("pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel")[];
        waterPipes: {
            material: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel";
            nominalIn: 1 | 2 | 1.25 | 1.5 | 0.375 | 0.5 | 0.75;
            lengthFt: number;
        }[];
        lowestRatedPsi: number | null;
        lowestRatedAirPsi: number | null;
        supplyPsi: number | null;
        floors: {
            name: string;
            elevationFt: number;
        }[];
        lowestFittingFt: number | null;
        highestFittingFt: number | null;
        ventTerminalFt: number | null;
        cappedVents: number;
        atticCutFt: number | null;
        standpipeFt: number | null;
        laundry: {
            floor: string;
            boxOutletFt: number | null;
            branchFt: number | null;
        } | null;
        pipeMaterial: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel" | null;
        plugs: {
            name: string;
            elevationFt: number;
            ratedPsi: number;
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3 | null;
        }[];
        pipes: {
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3;
            material: "pvc-sch40" | "abs-sch40";
            bottomFt: number;
            topFt: number;
            lengthFt: number;
        }[];
    };
    readonly threeFloors: {
        elevationFt: number | null;
        laundryTrapFt: number | null;
        gaugeFt: number | null;
        highestOutletFt: number | null;
        waterLowestFittingFt: number | null;
        waterPipeMaterials: ("pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel")[];
        waterPipes: {
            material: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel";
            nominalIn: 1 | 2 | 1.25 | 1.5 | 0.375 | 0.5 | 0.75;
            lengthFt: number;
        }[];
        lowestRatedPsi: number | null;
        lowestRatedAirPsi: number | null;
        supplyPsi: number | null;
        floors: {
            name: string;
            elevationFt: number;
        }[];
        lowestFittingFt: number | null;
        highestFittingFt: number | null;
        ventTerminalFt: number | null;
        cappedVents: number;
        atticCutFt: number | null;
        standpipeFt: number | null;
        laundry: {
            floor: string;
            boxOutletFt: number | null;
            branchFt: number | null;
        } | null;
        pipeMaterial: "pvc" | "abs" | "cpvc" | "pex" | "copper" | "cast-iron" | "steel" | null;
        plugs: {
            name: string;
            elevationFt: number;
            ratedPsi: number;
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3 | null;
        }[];
        pipes: {
            nominalIn: 2 | 4 | 6 | 1.25 | 1.5 | 3;
            material: "pvc-sch40" | "abs-sch40";
            bottomFt: number;
            topFt: number;
            lengthFt: number;
        }[];
    };
};
export type DemoHouse = keyof typeof demoHouses;
