"""What a firm keeps: issuing a calculation, the register, verifying and comparing what was issued, binding a project."""
