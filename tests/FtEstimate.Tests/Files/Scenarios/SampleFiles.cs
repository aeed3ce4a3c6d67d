namespace FtEstimate.Tests.Files.Scenarios;

/// <summary>A scenario with its machine and workload files, all keys right. The numbers are for tests, not of a real bench.</summary>
internal static class SampleFiles
{
    public const string Scenario = """
        title = "Spin lattice on the Brindle Fell array"
        machine = "machines/brindle-fell.toml"
        workload = "workloads/spin-lattice.toml"

        [goal]
        failure_probability = 0.05
        prefer = "least-atom-hours"
        atoms_at_most = 300_000
        run_at_most_days = 30

        [method]
        law = "published-fit"
        """;

    public const string Machine = """
        name = "Brindle Fell, 2026 bench"

        [array]
        pitch_um = 12
        block_spacing_um = 150
        field_diameter_um = 1500
        trap_power_mw = 1.4
        traps_per_stored_atom = 1.1

        [gates]
        cz_error = { likely = 3e-3, low = 2e-3, high = 4.5e-3, source = "bench log, 60 pairs" }
        cz_loss = { likely = 8.7e-4, low = 8.2e-4, high = 9.2e-4, source = "bench log" }
        cz_time_us = 0.27
        cz_pairs_at_once = 500
        one_qubit_error = { likely = 3e-4, low = 2e-4, high = 5e-4, source = "randomised benchmarking" }
        one_qubit_time_us = 2
        reset_error = 1e-3
        reset_time_us = 10
        between_species_cz_error = 2e-2
        between_species_cz_loss = 1e-3
        between_species_cz_time_us = 0.5

        [reach]
        kind = "moved-atoms"
        peak_acceleration_m_s2 = 8250
        profile = "cubic"
        handoff_time_us = 150
        handoff_error = 1e-3
        move_loss = 5e-4
        moved_at_once = 2000
        check_grids_move_together = { value = true, source = "two deflector pairs, installed in May" }
        pulse_gap_us = 3

        [coherence]
        t1_s = 119
        t2_s = { likely = 1.5, low = 1.0, high = 2.0, source = "XY16, moves included" }
        echo_pulses_per_round = 2
        vacuum_lifetime_s = 1374

        [detection]
        signal_counts_per_ms = 100
        background_counts_per_ms = 4
        depump_per_ms = 0.01
        loss_per_ms = 0.004
        exposure_us = "best"
        image_transfer_us = 200

        [readout]
        use = "shelve-one"

        [readout.shelve-one]
        kind = "shelved"
        shelve_time_us = 20
        shelve_error = 1e-3
        select_time_us = 6
        select_error = 1e-3
        select_at_once = 400
        shelved_t1_s = 1.6
        shelved_t2_s = 1.0
        residual_scatter_per_ms = 1e-3
        recool_time_us = 300

        [readout.second-one]
        kind = "second_species"
        ensemble_atoms = 1
        signal_counts_per_ms = 80
        background_counts_per_ms = 4
        depump_per_ms = 0.02
        loss_per_ms = 0.004
        data_disturbance_per_ms = 1e-4
        recool_time_us = 300
        banks = 2

        [readout.apart]
        kind = "moved_apart"
        distance_um = 100
        data_disturbance_per_ms = 2e-3
        recool_time_us = 300
        flip_error = 4.6e-3
        loss_per_look = 2.4e-3
        exposure_us = 500

        [readout.bare]
        kind = "in_place"
        data_disturbance_per_ms = 1000
        recool_time_us = 300

        [control]
        decode_us_per_round = 50
        feed_forward_us = 100

        [supply]
        atoms_per_s = 15_000
        spare_fraction = 0.05

        [running]
        mean_hours_between_stops = 100
        hours_to_restart = 1
        start_s = 5
        calibration_fraction = 0.1
        data_loss_check = "swap"
        data_loss_check_every_rounds = 4
        """;

    public const string Workload = """
        name = "Spin lattice, 10 by 10"

        [generate]
        family = "spin-lattice"
        rows = 10
        columns = 10
        time_in_inverse_coupling = 10
        trotter_error = 1e-2
        """;

    /// <summary>The same machine without physics.</summary>
    public const string AbstractMachine = """
        name = "As in a study"

        [abstract]
        uniform_error = 1e-3
        round_time_us = 1
        reaction_time_us = 10
        """;

    /// <summary>A workload by its counts.</summary>
    public const string CountedWorkload = """
        name = "Counted"

        [counts]
        logical_qubits = 100
        t_states = { likely = 1e8, low = 8e7, high = 2e8, source = "compiled" }
        reaction_depth = 1e6
        shots = 3
        """;
}
